import type { Metadata } from 'next';
import Link from 'next/link';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { YardsFigure } from '@/components/ui/figures';
import { Section } from '@/components/ui/section';
import { roleMay } from '@/lib/auth/policy';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { listOrders } from '@/lib/services/orders/list-orders';
import { getPlacement } from '@/lib/services/placements/get-placement';
import { dayText, decimalFigure } from '@/lib/text/format';
import { jobWords, placementWords as words } from '@/lib/text/messages/en/jobs';
import { OrderTable } from '../../_components/order-table';

export const metadata: Metadata = { title: words.kind };

export default async function PlacementPage({
  params,
}: {
  params: Promise<{ placementId: string }>;
}) {
  const actor = await requirePage('jobs.read');
  const { placementId } = await params;
  const placement = await ask(getPlacement, actor, { placementId });
  const orders = await ask(listOrders, actor, { placementId, limit: 500 });
  const { areaFt2, thicknessIn, jobId } = placement;
  return (
    <>
      <DocumentHead
        kind={words.kind}
        title={placement.name}
        facts={[
          {
            label: words.job,
            value: (
              <Link href={routes.job(jobId)}>
                {placement.jobNumber} {placement.jobName}
              </Link>
            ),
          },
          { label: words.day, value: dayText(placement.pourDate) },
          {
            label: words.element,
            value: [words.elements[placement.element], placement.subgrade]
              .filter(Boolean)
              .join(' on '),
          },
          ...(areaFt2 && thicknessIn
            ? [
                {
                  label: words.area,
                  value: words.planned(decimalFigure(thicknessIn), decimalFigure(areaFt2, 0)),
                },
              ]
            : []),
          { label: words.status, value: words.statuses[placement.status] },
        ]}
        actions={
          <>
            {roleMay(actor.role, 'jobs.write') && (
              <LinkButton href={routes.editPlacement(placementId)}>{words.edit}</LinkButton>
            )}
            <LinkButton variant="primary" href={`${routes.newOrder()}?placementId=${placementId}`}>
              {words.order}
            </LinkButton>
          </>
        }
      />
      <dl className="grid grid-cols-3 border-b border-wet">
        <Copy label={jobWords.columns.figured} value={placement.figuredYd3} look="" />
        <Copy
          label={jobWords.columns.ordered}
          value={placement.orderedYd3}
          look="perforated-right bg-paper"
        />
        <Copy
          label={jobWords.columns.delivered}
          value={placement.deliveredYd3}
          look="bg-canary"
          note={words.loads(placement.loads)}
        />
      </dl>
      <p className="flex flex-wrap gap-x-6 gap-y-1 px-4 pt-3 text-[14.5px] md:px-6">
        <Link href={`${routes.tickets()}?placementId=${placementId}`}>{words.tickets}</Link>
        <Link href={routes.pourDayPlacement(placementId)}>{words.pourDay}</Link>
      </p>
      {placement.notes && (
        <p className="max-w-2xl px-4 pt-3 whitespace-pre-wrap md:px-6">{placement.notes}</p>
      )}
      <Section title={jobWords.orders} bleed>
        <OrderTable rows={orders.rows} empty={jobWords.noOrders} />
      </Section>
    </>
  );
}

interface CopyProps {
  label: string;
  value: string | null;
  look: string;
  note?: string;
}

function Copy({ label, value, look, note }: CopyProps) {
  return (
    <div className={`px-4 py-3 md:px-6 ${look}`}>
      <dt className="font-head font-semibold">{label}</dt>
      <dd className="font-head text-xl md:text-[28px]">
        <YardsFigure value={value} />
        {note && <span className="block font-body text-[13px] text-ink-soft">{note}</span>}
      </dd>
    </div>
  );
}
