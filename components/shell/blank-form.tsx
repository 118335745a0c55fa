import type { ReactNode } from 'react';

interface BlankFormProps {
  title: ReactNode;
  children?: ReactNode;
  actions?: ReactNode;
}

/** A page that has only a few words to say: missing, refused or broken. */
export function BlankForm({ title, children, actions }: BlankFormProps) {
  return (
    <div className="mx-auto w-full max-w-xl py-6">
      <section className="border border-b-0 border-wet bg-sheet">
        <div className="double-rule mx-6 pt-7 pb-3">
          <h1 className="text-2xl">{title}</h1>
        </div>
        <div className="px-6 pt-4 pb-6">
          <div className="text-ink-soft">{children}</div>
          {actions && <div className="mt-5 flex flex-wrap gap-2">{actions}</div>}
        </div>
        <div aria-hidden className="perforated" />
      </section>
    </div>
  );
}
