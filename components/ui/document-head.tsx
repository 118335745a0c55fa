import type { ReactNode } from 'react';

interface Fact {
  label: string;
  value: ReactNode;
}

interface DocumentHeadProps {
  /** What kind of paper this is: "Statement from", "Job", "Order to". */
  kind: ReactNode;
  title: ReactNode;
  facts?: readonly Fact[];
  /** The document's main amounts, set large at the right. */
  figures?: readonly Fact[];
  actions?: ReactNode;
}

/** The headed band of a form: its kind, number and parties, its figures, and a double rule. */
export function DocumentHead({
  kind,
  title,
  facts = [],
  figures = [],
  actions,
}: DocumentHeadProps) {
  return (
    <header className="double-rule flex flex-wrap items-end gap-x-9 gap-y-3 px-4 pt-3.5 pb-3 md:px-6">
      <div className="min-w-0 max-w-full">
        <p className="text-xs tracking-wide text-ink-soft">{kind}</p>
        <h1 className="text-[22px] leading-tight break-words md:text-[26px]">{title}</h1>
      </div>
      {facts.length > 0 && (
        <dl className="flex flex-wrap gap-x-8 gap-y-2">
          {facts.map((fact) => (
            <div key={fact.label}>
              <dt className="text-xs tracking-wide text-ink-soft">{fact.label}</dt>
              <dd className="text-[15px]">{fact.value}</dd>
            </div>
          ))}
        </dl>
      )}
      {(figures.length > 0 || actions) && (
        <div className="flex flex-wrap items-end gap-x-8 gap-y-3 md:ml-auto">
          {figures.length > 0 && (
            <dl className="flex flex-wrap gap-x-8 gap-y-2">
              {figures.map((figure) => (
                <div key={figure.label} className="md:text-right">
                  <dt className="text-xs tracking-wide text-ink-soft">{figure.label}</dt>
                  <dd className="font-head text-xl leading-tight md:text-[22px]">{figure.value}</dd>
                </div>
              ))}
            </dl>
          )}
          {actions && (
            <div data-no-print className="flex flex-wrap gap-2">
              {actions}
            </div>
          )}
        </div>
      )}
    </header>
  );
}
