import { route } from '@/lib/http/route';
import { acceptRows } from '@/lib/services/statements/accept-rows';

export const POST = route(acceptRows);
