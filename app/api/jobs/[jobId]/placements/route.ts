import { route } from '@/lib/http/route';
import { createPlacement } from '@/lib/services/placements/create-placement';
import { listPlacements } from '@/lib/services/placements/list-placements';

export const GET = route(listPlacements);
export const POST = route(createPlacement);
