import type { Metadata } from 'next';
import { listQuery } from '@/components/shell/list-query';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { roleMay } from '@/lib/auth/policy';
import { listJobsInput } from '@/lib/contracts/jobs';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { listJobs } from '@/lib/services/jobs/list-jobs';
import { jobWords as words } from '@/lib/text/messages/en/jobs';
import { JobList } from './_components/job-list';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  searchParams: Promise<Record<string, string | string[]>>;
}

export default async function JobsPage({ searchParams }: PageProps) {
  const actor = await requirePage('jobs.read');
  const given = listQuery(await searchParams);
  // An address with a filter that makes no sense shows the whole list instead of nothing.
  const query = listJobsInput.safeParse(given).success ? given : {};
  const first = await ask(listJobs, actor, query);
  return (
    <>
      <DocumentHead
        kind={words.list}
        title={words.title}
        actions={
          roleMay(actor.role, 'jobs.write') && (
            <LinkButton href={routes.newJob()}>{words.add}</LinkButton>
          )
        }
      />
      <JobList first={first} firstQuery={query} />
    </>
  );
}
