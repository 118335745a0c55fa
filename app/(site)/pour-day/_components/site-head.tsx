import Link from 'next/link';
import type { ReactNode } from 'react';

interface SiteHeadProps {
  /** Where the way back leads, and its name. */
  back: { readonly href: string; readonly to: string };
  kind: ReactNode;
  title: ReactNode;
}

/** The head of a screen on site: the way back, what it is, a double rule. */
export function SiteHead({ back, kind, title }: SiteHeadProps) {
  return (
    <header className="double-rule flex items-center gap-1 pr-4">
      <Link
        href={back.href}
        aria-label={back.to}
        className="grid size-14 shrink-0 place-content-center text-3xl leading-none text-carbon no-underline"
      >
        <span aria-hidden>‹</span>
      </Link>
      <div className="min-w-0 py-2">
        <p className="truncate text-[13px] text-ink-soft">{kind}</p>
        <h1 className="text-xl leading-tight break-words">{title}</h1>
      </div>
    </header>
  );
}
