import { route } from '@/lib/http/route';
import { createRateSheet } from '@/lib/services/rate-sheets/create-rate-sheet';

export const POST = route(createRateSheet);
