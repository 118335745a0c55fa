import { route } from '@/lib/http/route';
import { confirmTicket } from '@/lib/services/tickets/confirm-ticket';

export const POST = route(confirmTicket);
