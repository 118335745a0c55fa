import { publicRoute } from '@/lib/http/public-route';
import { acceptInvitation } from '@/lib/services/auth/accept-invitation';

export const POST = publicRoute(acceptInvitation);
