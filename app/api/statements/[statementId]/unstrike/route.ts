import { route } from '@/lib/http/route';
import { unstrikeRows } from '@/lib/services/statements/unstrike-rows';

export const POST = route(unstrikeRows);
