import type { ReactNode } from 'react';
import { OfficeNav } from '@/components/shell/office-nav';
import { LocaleProvider } from '@/components/ui/locale';
import { requirePage } from '@/lib/http/page';
import { commonMessages } from '@/lib/text/messages/common';

/** The frame of the screens on site: one column, as high as the phone, the work at the thumb. */
export default async function SiteLayout({ children }: { children: ReactNode }) {
  const actor = await requirePage('tickets.write');
  return (
    <LocaleProvider locale={actor.locale}>
      <div lang={actor.locale} className="flex min-h-dvh flex-col bg-paper">
        <a
          href="#work"
          className="absolute top-1 left-2 z-30 -translate-y-16 bg-sheet px-3 py-2 focus:translate-y-0"
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
