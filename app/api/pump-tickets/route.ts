import { route } from '@/lib/http/route';
import { createPumpTicket } from '@/lib/services/pump-tickets/create-pump-ticket';
import { listPumpTickets } from '@/lib/services/pump-tickets/list-pump-tickets';

export const GET = route(listPumpTickets);
export const POST = route(createPumpTicket);
