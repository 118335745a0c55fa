import { route } from '@/lib/http/route';
import { strikeRows } from '@/lib/services/statements/strike-rows';

export const POST = route(strikeRows);
