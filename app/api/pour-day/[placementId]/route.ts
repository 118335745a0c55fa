import { route } from '@/lib/http/route';
import { getPourDayPlacement } from '@/lib/services/pour-day/get-pour-day-placement';

export const GET = route(getPourDayPlacement);
