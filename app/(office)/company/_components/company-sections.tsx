'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { classNames } from '@/components/ui/class-names';
import { routes } from '@/lib/routes';
import { company as words } from '@/lib/text/messages/en/company';

const SECTIONS = [
  { name: 'settings', href: routes.company() },
  { name: 'people', href: routes.people() },
  { name: 'outbox', href: routes.outbox() },
  { name: 'activity', href: routes.activity() },
  { name: 'keys', href: routes.accessKeys() },
] as const;

export function CompanySections() {
  const pathname = usePathname();
  return (
    <nav aria-label={words.kind} className="overflow-x-auto border-b border-cured bg-band">
      <ul className="flex px-2 md:px-3.5">
        {SECTIONS.map((section) => (
          <li key={section.name} className="shrink-0">
            <Link
              href={section.href}
              aria-current={section.href === pathname ? 'page' : undefined}
              className={classNames(
                'flex min-h-11 items-center px-2 text-[14.5px] md:px-2.5 no-underline -outline-offset-3 md:min-h-9',
                section.href === pathname
                  ? 'font-semibold text-ink shadow-[inset_0_-3px_0_var(--carbon)]'
                  : 'text-ink-soft hover:text-ink',
              )}
            >
              {words.sections[section.name]}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
