import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getJob } from '@/lib/services/jobs/get-job';
import { jobChoices } from '@/lib/services/jobs/job-choices';
import { jobWords as words } from '@/lib/text/messages/en/jobs';
import { JobForm } from '../../_components/job-form';

export const metadata: Metadata = { title: words.edit };

export default async function EditJobPage({ params }: { params: Promise<{ jobId: string }> }) {
  const actor = await requirePage('jobs.write');
  const { jobId } = await params;
  const job = await ask(getJob, actor, { jobId });
  const { foremen } = await ask(jobChoices, actor, {});
  return (
    <>
      <DocumentHead kind={`${words.kind} ${job.number}`} title={words.edit} />
      <JobForm job={job} foremen={foremen} />
    </>
  );
}
