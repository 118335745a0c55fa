import type { Metadata } from 'next';
import Link from 'next/link';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { YardsFigure } from '@/components/ui/figures';
import { Section } from '@/components/ui/section';
import { roleMay } from '@/lib/auth/policy';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { getJob } from '@/lib/services/jobs/get-job';
import { listOrders } from '@/lib/services/orders/list-orders';
import { listPlacements } from '@/lib/services/placements/list-placements';
import { placementWords, jobWords as words } from '@/lib/text/messages/en/jobs';
import { OrderTable } from '../../_components/order-table';
import { PlacementTable } from '../_components/placement-table';

export const metadata: Metadata = { title: words.title };

export default async function JobPage({ params }: { params: Promise<{ jobId: string }> }) {
  const actor = await requirePage('jobs.read');
  const { jobId } = await params;
  const job = await ask(getJob, actor, { jobId });
  const placements = await ask(listPlacements, actor, { jobId, limit: 500 });
  const orders = await ask(listOrders, actor, { jobId, limit: 500 });
  const mayWrite = roleMay(actor.role, 'jobs.write');
  return (
    <>
      <DocumentHead
        kind={`${words.kind} ${job.number}`}
        title={job.name}
        facts={[
          { label: words.customer, value: job.customer || '–' },
          { label: words.address, value: job.address || '–' },
          { label: words.crew, value: job.crew.map((one) => one.name).join(', ') || words.noCrew },
        ]}
        figures={[
          { label: words.columns.figured, value: <YardsFigure value={job.figuredYd3} /> },
          { label: words.columns.ordered, value: <YardsFigure value={job.orderedYd3} /> },
          { label: words.columns.delivered, value: <YardsFigure value={job.deliveredYd3} /> },
        ]}
        actions={mayWrite && <LinkButton href={routes.editJob(jobId)}>{words.edit}</LinkButton>}
      />
      <p className="flex flex-wrap gap-x-6 gap-y-1 px-4 pt-3 text-[14.5px] md:px-6">
        <Link href={`${routes.tickets()}?jobId=${jobId}`}>{words.tickets}</Link>
        {roleMay(actor.role, 'yield.read') && (
          <Link href={`${routes.yield()}?jobId=${jobId}`}>{words.yieldLink}</Link>
        )}
      </p>
      <Section
        title={words.placements}
        action={
          mayWrite && (
            <LinkButton href={routes.newPlacement(jobId)}>{placementWords.add}</LinkButton>
          )
        }
        bleed
      >
        <PlacementTable rows={placements.rows} empty={words.noPlacements} />
      </Section>
      <Section title={words.orders} bleed>
        <OrderTable rows={orders.rows} empty={words.noOrders} />
      </Section>
    </>
  );
}
