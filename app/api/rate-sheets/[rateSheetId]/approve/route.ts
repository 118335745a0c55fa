import { route } from '@/lib/http/route';
import { approveRateSheet } from '@/lib/services/rate-sheets/approve-rate-sheet';

export const POST = route(approveRateSheet);
