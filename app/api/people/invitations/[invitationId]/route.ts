import { route } from '@/lib/http/route';
import { withdrawInvitation } from '@/lib/services/people/withdraw-invitation';

export const DELETE = route(withdrawInvitation);
