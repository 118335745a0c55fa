import type { ReactNode } from 'react';
import type { Actor } from '@/lib/auth/actor';
import { commonMessages } from '@/lib/text/messages/common';
import { LocaleProvider } from '../ui/locale';
import { OfficeNav } from './office-nav';

interface OfficeShellProps {
  actor: Pick<Actor, 'name' | 'role' | 'locale'>;
  children: ReactNode;
}

/**
 * The office's frame: index tabs above, the work below. Pages fill the rest; a page that scrolls
 * only inside itself takes `flex-1 min-h-0` in a column as high as the window.
 */
export function OfficeShell({ actor, children }: OfficeShellProps) {
  return (
    <LocaleProvider locale={actor.locale}>
      <div lang={actor.locale} className="flex min-h-dvh flex-col bg-paper print:block">
        <a
          href="#work"
          className="absolute left-2 top-1 z-30 -translate-y-16 bg-sheet px-3 py-2 focus:translate-y-0"
        >
          {commonMessages(actor.locale).skipToWork}
        </a>
        <OfficeNav person={{ name: actor.name, role: actor.role }} />
        <main id="work" tabIndex={-1} className="flex min-h-0 flex-1 flex-col outline-none">
          {children}
        </main>
      </div>
    </LocaleProvider>
  );
}
