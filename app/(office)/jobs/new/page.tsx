import type { Metadata } from 'next';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { jobChoices } from '@/lib/services/jobs/job-choices';
import { jobWords as words } from '@/lib/text/messages/en/jobs';
import { JobForm } from '../_components/job-form';

export const metadata: Metadata = { title: words.add };

export default async function NewJobPage() {
  const actor = await requirePage('jobs.write');
  const { foremen } = await ask(jobChoices, actor, {});
  return (
    <>
      <DocumentHead kind={words.kind} title={words.add} />
      <JobForm job={null} foremen={foremen} />
    </>
  );
}
