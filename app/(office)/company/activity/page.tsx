import type { Metadata } from 'next';
import { listQuery } from '@/components/shell/list-query';
import { ask, requirePage } from '@/lib/http/page';
import { listActivity } from '@/lib/services/activity/list-activity';
import { listPeople } from '@/lib/services/people/list-people';
import { company as words } from '@/lib/text/messages/en/company';
import { ActivityLog } from '../_components/activity-log';

export const metadata: Metadata = { title: words.sections.activity };

interface PageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function ActivityPage({ searchParams }: PageProps) {
  const actor = await requirePage('activity.read');
  const query = listQuery(await searchParams);
  const first = await ask(listActivity, actor, query);
  const { people } = await ask(listPeople, actor, {});
  return (
    <ActivityLog
      firstQuery={query}
      first={first}
      people={people.map(({ id, name }) => ({ id, name }))}
    />
  );
}
