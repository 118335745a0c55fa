import { route } from '@/lib/http/route';
import { rejectTicket } from '@/lib/services/tickets/reject-ticket';

export const POST = route(rejectTicket);
