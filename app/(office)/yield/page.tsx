import type { Metadata } from 'next';
import { listQuery } from '@/components/shell/list-query';
import { DocumentHead } from '@/components/ui/document-head';
import { listYieldInput } from '@/lib/contracts/yield';
import { ask, requirePage } from '@/lib/http/page';
import { listYield } from '@/lib/services/yield/list-yield';
import { yieldWords as words } from '@/lib/text/messages/en/yield';
import { YieldScreen } from './_components/yield-screen';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  searchParams: Promise<Record<string, string | string[]>>;
}

export default async function YieldPage({ searchParams }: PageProps) {
  const actor = await requirePage('yield.read');
  const given = listQuery(await searchParams);
  // An address with a filter that makes no sense shows the whole list instead of nothing.
  const query = listYieldInput.safeParse(given).success ? given : {};
  const first = await ask(listYield, actor, query);
  return (
    <>
      <DocumentHead kind={words.kind} title={words.title} />
      <YieldScreen first={first} firstQuery={query} />
    </>
  );
}
