import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { homeOf } from '@/components/shell/home-of';
import { sessionActor } from '@/lib/http/request-actor';
import { SignUpForm } from '../_components/sign-up-form';

export const metadata: Metadata = { title: 'Set up a company' };

export default async function SignUpPage() {
  const actor = await sessionActor();
  if (actor) redirect(homeOf(actor.role));
  return <SignUpForm />;
}
