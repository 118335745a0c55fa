'use client';

import { useLocale } from '@/components/ui/locale';
import type { SignInHints } from '@/lib/contracts/auth';
import { authMessages } from '@/lib/text/messages/auth';
import { commonMessages } from '@/lib/text/messages/common';

interface DemoPeopleProps {
  demo: NonNullable<SignInHints['demo']>;
  onTake: (email: string, password: string) => void;
}

/** The demo company's people: one press fills the form. */
export function DemoPeople({ demo, onTake }: DemoPeopleProps) {
  const locale = useLocale();
  const words = authMessages(locale).demo;
  const roles: Readonly<Record<string, string>> = commonMessages(locale).roles;
  return (
    <section aria-labelledby="demo-people" className="mt-10 w-full max-w-[26rem]">
      <h2 id="demo-people" className="text-[17px]">
        {words.title(demo.companyName)}
      </h2>
      <p className="mt-0.5 text-[14px] text-ink-soft">{words.says}</p>
      <ul className="mt-3 border-y border-wet">
        {demo.people.map((person) => (
          <li key={person.email} className="border-b border-cured last:border-b-0">
            <button
              type="button"
              onClick={() => onTake(person.email, demo.password)}
              className="flex min-h-12 w-full items-baseline gap-3 px-1 py-2 text-left hover:bg-band md:min-h-10"
            >
              <span className="font-semibold text-carbon underline underline-offset-2">
                {person.name}
              </span>
              <span className="text-[14px] text-ink-soft">{roles[person.role] ?? person.role}</span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
