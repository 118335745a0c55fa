import type { Metadata } from 'next';
import { listQuery } from '@/components/shell/list-query';
import { ask, requirePage } from '@/lib/http/page';
import { listOutbox } from '@/lib/services/outbox/list-outbox';
import { company as words } from '@/lib/text/messages/en/company';
import { OutboxList } from '../_components/outbox-list';

export const metadata: Metadata = { title: words.sections.outbox };

interface PageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function OutboxPage({ searchParams }: PageProps) {
  const actor = await requirePage('outbox.read');
  const query = listQuery(await searchParams);
  return <OutboxList firstQuery={query} first={await ask(listOutbox, actor, query)} />;
}
