import { route } from '@/lib/http/route';
import { attachTicket } from '@/lib/services/tickets/attach-ticket';

export const POST = route(attachTicket);
