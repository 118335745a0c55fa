import type { ReactNode } from 'react';
import { classNames } from './class-names';

interface SectionProps {
  title: ReactNode;
  says?: ReactNode;
  action?: ReactNode;
  children: ReactNode;
  /** The content (a table) reaches the page's edges; only the heading keeps its margin. */
  bleed?: boolean;
  className?: string;
}

/** A ruled part of a form: its heading above a rule, its content below. */
export function Section({ title, says, action, children, bleed = false, className }: SectionProps) {
  return (
    <section className={classNames('pt-6 pb-2', className)}>
      <div className="mx-4 flex flex-wrap items-end justify-between gap-x-6 gap-y-2 border-b border-wet pb-1.5 md:mx-6">
        <h2 className="text-lg">{title}</h2>
        {action}
      </div>
      {says && <p className="mx-4 mt-2 max-w-2xl text-[14.5px] text-ink-soft md:mx-6">{says}</p>}
      <div className={bleed ? 'pt-3' : 'px-4 pt-3 md:px-6'}>{children}</div>
    </section>
  );
}
