import { route } from '@/lib/http/route';
import { getTicket } from '@/lib/services/tickets/get-ticket';
import { updateTicket } from '@/lib/services/tickets/update-ticket';

export const GET = route(getTicket);
export const PUT = route(updateTicket);
