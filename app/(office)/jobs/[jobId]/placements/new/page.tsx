import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getJob } from '@/lib/services/jobs/get-job';
import { jobWords, placementWords as words } from '@/lib/text/messages/en/jobs';
import { PlacementForm } from '../../../../_components/placement-form';

export const metadata: Metadata = { title: words.add };

export default async function NewPlacementPage({ params }: { params: Promise<{ jobId: string }> }) {
  const actor = await requirePage('jobs.write');
  const { jobId } = await params;
  const job = await ask(getJob, actor, { jobId });
  return (
    <>
      <DocumentHead kind={`${jobWords.kind} ${job.number} ${job.name}`} title={words.add} />
      <PlacementForm jobId={jobId} placement={null} />
    </>
  );
}
