import type { ReactNode } from 'react';

interface EmptyStateProps {
  title: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
}

/** A blank form where a list will be: says what belongs here and how the first entry is made. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <section className="my-6 max-w-xl border border-wet border-b-2 border-b-[color:var(--wet)] bg-sheet [border-bottom-style:dotted]">
      <div className="px-6 pt-6 pb-5">
        <h2 className="text-xl">{title}</h2>
        {children && <div className="mt-1.5 text-ink-soft">{children}</div>}
        {action && <div className="mt-4 flex flex-wrap gap-2">{action}</div>}
      </div>
      <div aria-hidden className="mx-6 mb-6 grid gap-5 pt-1">
        <span className="border-b border-cured" />
        <span className="border-b border-cured" />
        <span className="border-b-[3px] border-double border-cured" />
      </div>
    </section>
  );
}
