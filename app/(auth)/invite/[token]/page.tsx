import type { Metadata } from 'next';
import { InviteForm } from '../../_components/invite-form';

export const metadata: Metadata = { title: 'Invitation', referrer: 'no-referrer' };

interface PageProps {
  params: Promise<{ token: string }>;
}

export default async function InvitePage({ params }: PageProps) {
  const { token } = await params;
  return <InviteForm token={token} />;
}
