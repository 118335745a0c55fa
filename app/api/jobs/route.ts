import { route } from '@/lib/http/route';
import { createJob } from '@/lib/services/jobs/create-job';
import { listJobs } from '@/lib/services/jobs/list-jobs';

export const GET = route(listJobs);
export const POST = route(createJob);
