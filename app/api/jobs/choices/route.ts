import { route } from '@/lib/http/route';
import { jobChoices } from '@/lib/services/jobs/job-choices';

export const GET = route(jobChoices);
