import type { Metadata } from 'next';
import { listQuery } from '@/components/shell/list-query';
import { DocumentHead } from '@/components/ui/document-head';
import { Difference } from '@/components/ui/figures';
import { listVariancesInput } from '@/lib/contracts/variances';
import { ask, requirePage } from '@/lib/http/page';
import { listVariances } from '@/lib/services/variances/list-variances';
import { variances as words } from '@/lib/text/messages/en/statements';
import { VarianceList } from './_components/variance-list';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  searchParams: Promise<Record<string, string | string[]>>;
}

export default async function VariancesPage({ searchParams }: PageProps) {
  const actor = await requirePage('variances.read');
  const given = listQuery(await searchParams);
  // An address with a filter that makes no sense shows the whole list instead of nothing.
  const query = listVariancesInput.safeParse(given).success ? given : {};
  const first = await ask(listVariances, actor, query);
  const all = await ask(listVariances, actor, { limit: 1 });
  return (
    <>
      <DocumentHead
        kind={words.kind}
        title={words.title}
        figures={[
          { label: words.against, value: <Difference value={all.totals.against} /> },
          { label: words.favour, value: <Difference value={all.totals.inOurFavour} /> },
        ]}
      />
      <VarianceList first={first} firstQuery={query} />
    </>
  );
}
