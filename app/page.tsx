import { redirect } from 'next/navigation';
import { homeOf } from '@/components/shell/home-of';
import { Wordmark } from '@/components/shell/wordmark';
import { LinkButton } from '@/components/ui/button';
import { sessionActor } from '@/lib/http/request-actor';
import { routes } from '@/lib/routes';

export default async function Home() {
  const actor = await sessionActor();
  if (actor) redirect(homeOf(actor.role));
  return (
    <main className="p-6">
      <Wordmark className="text-2xl" />
      <LinkButton href={routes.signIn()}>Sign in</LinkButton>
    </main>
  );
}
