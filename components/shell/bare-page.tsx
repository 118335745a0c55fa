import Link from 'next/link';
import type { ReactNode } from 'react';
import { routes } from '@/lib/routes';
import { Wordmark } from './wordmark';

/** A page outside every frame: the name above, one form on the desk. */
export function BarePage({ aside, children }: { aside?: ReactNode; children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col bg-desk">
      <header className="flex items-center justify-between gap-4 px-4 py-2 md:px-6">
        <Link href={routes.home()} className="py-2 text-[22px] no-underline">
          <Wordmark />
        </Link>
        {aside}
      </header>
      <main className="flex flex-1 flex-col items-center px-4 pt-4 pb-16 md:pt-[8vh]">
        {children}
      </main>
    </div>
  );
}
