import { route } from '@/lib/http/route';
import { listVariances } from '@/lib/services/variances/list-variances';

export const GET = route(listVariances);
