import type { Metadata } from 'next';
import { ResetPasswordForm } from '../../_components/reset-password-form';

export const metadata: Metadata = { title: 'New password', referrer: 'no-referrer' };

interface PageProps {
  params: Promise<{ token: string }>;
}

export default async function ResetPasswordPage({ params }: PageProps) {
  const { token } = await params;
  return <ResetPasswordForm token={token} />;
}
