import { route } from '@/lib/http/route';
import { deleteRateSheet } from '@/lib/services/rate-sheets/delete-rate-sheet';
import { getRateSheet } from '@/lib/services/rate-sheets/get-rate-sheet';
import { updateRateSheet } from '@/lib/services/rate-sheets/update-rate-sheet';

export const GET = route(getRateSheet);
export const PUT = route(updateRateSheet);
export const DELETE = route(deleteRateSheet);
