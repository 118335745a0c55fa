import { route } from '@/lib/http/route';
import { getPumpTicket } from '@/lib/services/pump-tickets/get-pump-ticket';
import { updatePumpTicket } from '@/lib/services/pump-tickets/update-pump-ticket';

export const GET = route(getPumpTicket);
export const PUT = route(updatePumpTicket);
