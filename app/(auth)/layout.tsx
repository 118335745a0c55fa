import Link from 'next/link';
import type { ReactNode } from 'react';
import { LanguageSwitch } from '@/components/shell/language-switch';
import { Wordmark } from '@/components/shell/wordmark';
import { routes } from '@/lib/routes';

/** Sign-in and its neighbours: one form on the desk. */
export default function AuthLayout({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col bg-desk">
      <header className="flex items-center justify-between gap-4 px-4 py-2 md:px-6">
        <Link href={routes.home()} className="py-2 text-[22px] no-underline">
          <Wordmark />
        </Link>
        <LanguageSwitch />
      </header>
      <main className="flex flex-1 flex-col items-center px-4 pt-4 pb-16 md:pt-[8vh]">
        {children}
      </main>
    </div>
  );
}
