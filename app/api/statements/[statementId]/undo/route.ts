import { route } from '@/lib/http/route';
import { undoLast } from '@/lib/services/statements/undo';

export const POST = route(undoLast);
