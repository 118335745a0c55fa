import { fileRoute } from '@/lib/http/route';
import { exportTickets } from '@/lib/services/tickets/export-tickets';

export const GET = fileRoute(exportTickets);
