import { route } from '@/lib/http/route';
import { unmatchLine } from '@/lib/services/statements/unmatch-line';

export const POST = route(unmatchLine);
