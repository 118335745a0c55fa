import { route } from '@/lib/http/route';
import { closeStatement } from '@/lib/services/statements/close-statement';

export const POST = route(closeStatement);
