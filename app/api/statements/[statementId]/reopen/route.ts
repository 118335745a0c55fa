import { route } from '@/lib/http/route';
import { reopenStatement } from '@/lib/services/statements/reopen-statement';

export const POST = route(reopenStatement);
