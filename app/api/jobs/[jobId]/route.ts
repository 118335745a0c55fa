import { route } from '@/lib/http/route';
import { getJob } from '@/lib/services/jobs/get-job';
import { updateJob } from '@/lib/services/jobs/update-job';

export const GET = route(getJob);
export const PUT = route(updateJob);
