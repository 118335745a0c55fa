import type { Metadata } from 'next';
import { WhereProvider } from '@/components/ui/where';
import { ask, requirePage } from '@/lib/http/page';
import { getPourDay } from '@/lib/services/pour-day/get-pour-day';
import { DayScreen } from './_components/day-screen';

export const metadata: Metadata = { title: 'Pour day' };

interface PageProps {
  searchParams: Promise<{ day?: string }>;
}

export default async function PourDayPage({ searchParams }: PageProps) {
  const actor = await requirePage('tickets.write');
  const { day } = await searchParams;
  const first = await ask(getPourDay, actor, day === undefined ? {} : { day });
  return (
    <WhereProvider where={first.times}>
      <DayScreen first={first} name={actor.name} />
    </WhereProvider>
  );
}
