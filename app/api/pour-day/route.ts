import { route } from '@/lib/http/route';
import { getPourDay } from '@/lib/services/pour-day/get-pour-day';

export const GET = route(getPourDay);
