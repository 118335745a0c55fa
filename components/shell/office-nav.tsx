'use client';

import Link from 'next/link';
import type { Role } from '@/lib/auth/policy';
import { roleMay } from '@/lib/auth/policy';
import { routes } from '@/lib/routes';
import { classNames } from '../ui/class-names';
import { useCommon } from '../ui/locale';
import { SignOutButton } from './sign-out-button';
import { isUnder, tabsFor } from './tabs';
import { useDisclosure } from './use-disclosure';
import { Wordmark } from './wordmark';

interface NavProps {
  person: { readonly name: string; readonly role: Role };
}

const MENU_ROW =
  'flex min-h-12 w-full items-center border-t border-cured px-4 text-left text-ink no-underline hover:bg-band md:min-h-10';

/** The slim band of index dividers above every office page; one menu on a phone. */
export function OfficeNav({ person }: NavProps) {
  const words = useCommon();
  return (
    <nav
      aria-label={words.mainMenu}
      className="relative z-20 flex items-end border-b border-cured bg-desk px-3 md:px-5"
    >
      <Link
        href={routes.home()}
        className="mr-4 grid min-h-12 shrink-0 place-content-center text-[19px] no-underline xl:mr-6"
      >
        <Wordmark />
      </Link>
      <TabBand person={person} />
      <PersonMenu person={person} />
    </nav>
  );
}

function TabBand({ person }: NavProps) {
  const words = useCommon();
  const { pathname } = useDisclosure();
  return (
    <ul className="hidden min-w-0 flex-1 gap-[3px] self-end overflow-x-auto pt-2.5 lg:flex">
      {tabsFor(person.role).map((tab) => {
        const here = isUnder(tab, pathname);
        return (
          <li key={tab.name} className="shrink-0">
            <Link
              href={tab.href}
              aria-current={here ? 'page' : undefined}
              className={classNames(
                'block rounded-t-[5px] border border-b-0 border-cured px-3.5 py-2 text-[14.5px] no-underline -outline-offset-3',
                here ? 'bg-paper font-semibold text-ink' : 'bg-tab text-ink-soft hover:text-ink',
              )}
            >
              {words.tabs[tab.name]}
            </Link>
          </li>
        );
      })}
    </ul>
  );
}

function PersonMenu({ person }: NavProps) {
  const words = useCommon();
  const { open, toggle, area, button, pathname } = useDisclosure();
  const here = tabsFor(person.role).find((tab) => isUnder(tab, pathname));
  return (
    <div ref={area} className="ml-auto self-center">
      <button
        ref={button}
        type="button"
        onClick={toggle}
        aria-expanded={open}
        aria-controls="person-menu"
        className="flex min-h-11 items-center gap-2 px-2 text-[14.5px] text-ink-soft hover:text-ink"
      >
        <span className="hidden lg:inline">
          {person.name} · {words.roles[person.role]}
        </span>
        <span className="font-semibold text-ink lg:hidden">
          {here ? words.tabs[here.name] : words.menu}
          <span className="sr-only"> · {words.menu}</span>
        </span>
        <span aria-hidden className="text-[11px]">
          {open ? '▲' : '▼'}
        </span>
      </button>
      <div
        id="person-menu"
        hidden={!open}
        className="absolute inset-x-0 top-full border border-wet bg-sheet lg:left-auto lg:right-4 lg:w-60"
      >
        <p className="px-4 py-2.5 text-sm text-ink-soft lg:hidden">
          {person.name} · {words.roles[person.role]}
        </p>
        <ul className="grid grid-cols-2 lg:hidden">
          {tabsFor(person.role).map((tab) => (
            <li key={tab.name} className="odd:border-r odd:border-cured">
              <Link
                href={tab.href}
                aria-current={isUnder(tab, pathname) ? 'page' : undefined}
                className={classNames(MENU_ROW, isUnder(tab, pathname) && 'font-semibold')}
              >
                {words.tabs[tab.name]}
              </Link>
            </li>
          ))}
        </ul>
        <div className="border-t-[3px] border-double border-wet">
          {person.role !== 'foreman' && roleMay(person.role, 'tickets.write') && (
            <Link href={routes.pourDay()} className={MENU_ROW}>
              {words.tabs.pourDay}
            </Link>
          )}
          <Link href={routes.account()} className={MENU_ROW}>
            {words.account}
          </Link>
          <SignOutButton className={MENU_ROW} />
        </div>
      </div>
    </div>
  );
}
