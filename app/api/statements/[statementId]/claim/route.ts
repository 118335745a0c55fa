import { route } from '@/lib/http/route';
import { claimRows } from '@/lib/services/statements/claim-rows';

export const POST = route(claimRows);
