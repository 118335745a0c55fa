import type { ReactNode } from 'react';
import { DocumentHead } from '@/components/ui/document-head';
import { WhereProvider } from '@/components/ui/where';
import { ask, requirePage } from '@/lib/http/page';
import { getCompany } from '@/lib/services/company/get-company';
import { company as words } from '@/lib/text/messages/en/company';
import { CompanySections } from './_components/company-sections';

export default async function CompanyLayout({ children }: { children: ReactNode }) {
  const actor = await requirePage('company.read');
  const company = await ask(getCompany, actor, {});
  return (
    <WhereProvider where={{ timeZone: company.timeZone, clock: company.clock }}>
      <DocumentHead
        kind={words.kind}
        title={company.name}
        facts={[
          { label: words.timeZone, value: company.timeZone.replaceAll('_', ' ') },
          {
            label: words.clock,
            value: company.clock === '12' ? words.settings.clock12 : words.settings.clock24,
          },
        ]}
      />
      <CompanySections />
      <div className="pb-10">{children}</div>
    </WhereProvider>
  );
}
