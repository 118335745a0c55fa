import { cookies } from 'next/headers';
import { redirect } from 'next/navigation';
import { homeOf } from '@/components/shell/home-of';
import { LanguageSwitch } from '@/components/shell/language-switch';
import { Wordmark } from '@/components/shell/wordmark';
import { LinkButton } from '@/components/ui/button';
import { sessionActor } from '@/lib/http/request-actor';
import { routes } from '@/lib/routes';
import { LOCALE_COOKIE, localeOf } from '@/lib/text/locale';
import { homeMessages } from '@/lib/text/messages/home';
import { ThreeCopies } from './_components/three-copies';

export default async function Home() {
  const actor = await sessionActor();
  if (actor) redirect(homeOf(actor.role));
  const locale = localeOf((await cookies()).get(LOCALE_COOKIE)?.value);
  const words = homeMessages(locale);
  return (
    <div className="min-h-dvh bg-desk md:px-8 md:py-6">
      <div className="mx-auto max-w-6xl border-wet bg-paper md:border">
        <header className="double-rule flex flex-wrap items-center gap-x-6 gap-y-1 px-4 py-3 md:px-10">
          <Wordmark className="text-[26px]" />
          <div className="ml-auto">
            <LanguageSwitch />
          </div>
        </header>
        <main>
          <section className="grid gap-8 px-4 pt-8 pb-10 md:px-10 md:pt-14 lg:grid-cols-[1.15fr_1fr] lg:gap-14">
            <div>
              <p className="text-[13px] tracking-wide text-ink-soft">{words.kind}</p>
              <h1 className="mt-1 text-[34px] leading-[1.12] md:text-[52px]">{words.title}</h1>
            </div>
            <div className="lg:pt-6">
              <p className="text-[17px] leading-relaxed">{words.says}</p>
              <p className="mt-6 flex flex-wrap gap-2.5">
                <LinkButton
                  href={routes.signIn()}
                  variant="primary"
                  className="min-h-12 px-6 md:min-h-12"
                >
                  {words.signIn}
                </LinkButton>
                <LinkButton href={routes.signUp()} className="min-h-12 px-6 md:min-h-12">
                  {words.signUp}
                </LinkButton>
              </p>
            </div>
          </section>
          <section className="border-t border-cured bg-band px-4 py-8 md:px-10 md:py-10">
            <ThreeCopies locale={locale} />
          </section>
          <section className="border-t border-wet px-4 pt-7 pb-10 md:px-10">
            <h2 className="text-xl">{words.peopleTitle}</h2>
            <dl className="mt-3 grid gap-x-10 md:grid-cols-3">
              {words.people.map((one) => (
                <div key={one.who} className="border-t border-cured pt-3 pb-4">
                  <dt className="font-head text-[17px] font-semibold">{one.who}</dt>
                  <dd className="mt-1 text-ink-soft">{one.what}</dd>
                </div>
              ))}
            </dl>
          </section>
        </main>
      </div>
    </div>
  );
}
