import type { Metadata } from 'next';
import { WhereProvider } from '@/components/ui/where';
import { ask, requirePage } from '@/lib/http/page';
import { getPourDayPlacement } from '@/lib/services/pour-day/get-pour-day-placement';
import { PlacementScreen } from '../_components/placement-screen';

export const metadata: Metadata = { title: 'Pour day' };

interface PageProps {
  params: Promise<{ placementId: string }>;
}

export default async function PourDayPlacementPage({ params }: PageProps) {
  const actor = await requirePage('tickets.write');
  const first = await ask(getPourDayPlacement, actor, await params);
  return (
    <WhereProvider where={first.times}>
      <PlacementScreen first={first} />
    </WhereProvider>
  );
}
