import { route } from '@/lib/http/route';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';

export const GET = route(ticketChoices);
