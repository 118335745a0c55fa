import { route } from '@/lib/http/route';
import { getPlacement } from '@/lib/services/placements/get-placement';
import { updatePlacement } from '@/lib/services/placements/update-placement';

export const GET = route(getPlacement);
export const PUT = route(updatePlacement);
