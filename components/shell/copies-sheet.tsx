import type { ReactNode } from 'react';
import { classNames } from '../ui/class-names';

interface CopiesSheetProps {
  kind: ReactNode;
  title: ReactNode;
  children: ReactNode;
  className?: string;
}

/** A white form lying on its canary and pink copies: the sheet of everything outside the office. */
export function CopiesSheet({ kind, title, children, className }: CopiesSheetProps) {
  return (
    <div className={classNames('relative w-full max-w-[26rem]', className)}>
      <div
        aria-hidden
        className="absolute inset-0 translate-x-2.5 translate-y-2.5 border border-pink-deep bg-pink"
      />
      <div
        aria-hidden
        className="absolute inset-0 translate-x-[5px] translate-y-[5px] border border-canary-deep bg-canary"
      />
      <section className="relative border border-wet bg-sheet">
        <header className="double-rule mx-5 pt-5 pb-2.5 md:mx-6">
          <p className="text-xs tracking-wide text-ink-soft">{kind}</p>
          <h1 className="text-[23px] leading-tight">{title}</h1>
        </header>
        <div className="px-5 pt-5 pb-6 md:px-6">{children}</div>
      </section>
    </div>
  );
}
