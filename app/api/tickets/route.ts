import { route } from '@/lib/http/route';
import { createTicket } from '@/lib/services/tickets/create-ticket';
import { listTickets } from '@/lib/services/tickets/list-tickets';

export const GET = route(listTickets);
export const POST = route(createTicket);
