import { route } from '@/lib/http/route';
import { listYield } from '@/lib/services/yield/list-yield';

export const GET = route(listYield);
