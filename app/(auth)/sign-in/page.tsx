import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { homeOf } from '@/components/shell/home-of';
import { sessionActor } from '@/lib/http/request-actor';
import { SignInForm } from '../_components/sign-in-form';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage() {
  const actor = await sessionActor();
  if (actor) redirect(homeOf(actor.role));
  return <SignInForm />;
}
