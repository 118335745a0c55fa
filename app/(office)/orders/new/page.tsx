import type { Metadata } from 'next';
import { timeText } from '@/components/forms/typed-form';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getPlacement } from '@/lib/services/placements/get-placement';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { orderWords as words } from '@/lib/text/messages/en/jobs';
import { withWaste } from '../../_components/slab-yards';
import { OrderForm } from '../_components/order-form';
import { EMPTY_LINE, emptyOrderForm } from '../_components/order-form-schema';

export const metadata: Metadata = { title: words.newTitle };

interface PageProps {
  searchParams: Promise<{ placementId?: string | string[] }>;
}

export default async function NewOrderPage({ searchParams }: PageProps) {
  const actor = await requirePage('orders.write');
  const { placementId } = await searchParams;
  const choices = await ask(ticketChoices, actor, {});
  const placement =
    typeof placementId === 'string' ? await ask(getPlacement, actor, { placementId }) : null;
  const start = emptyOrderForm(
    placement
      ? {
          jobId: placement.jobId,
          placementId: placement.id,
          pourDate: placement.pourDate,
          firstTruckAt: timeText(placement.firstTruckAt),
          lines: [
            {
              ...EMPTY_LINE,
              quantity:
                withWaste(placement.figuredYd3, placement.wastePercent) ?? placement.figuredYd3,
            },
          ],
        }
      : {},
  );
  return (
    <>
      <DocumentHead kind={words.kind} title={words.newTitle} />
      <OrderForm order={null} start={start} choices={choices} />
    </>
  );
}
