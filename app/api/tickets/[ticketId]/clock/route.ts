import { route } from '@/lib/http/route';
import { setClock } from '@/lib/services/tickets/set-clock';

export const POST = route(setClock);
