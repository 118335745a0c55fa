import type { Metadata } from 'next';
import { ask, requirePage } from '@/lib/http/page';
import { listPeople } from '@/lib/services/people/list-people';
import { company as words } from '@/lib/text/messages/en/company';
import { PeopleBoard } from '../_components/people-board';

export const metadata: Metadata = { title: words.sections.people };

export default async function PeoplePage() {
  const actor = await requirePage('people.manage');
  return <PeopleBoard first={await ask(listPeople, actor, {})} />;
}
