import { publicRoute } from '@/lib/http/public-route';
import { getInvitation } from '@/lib/services/auth/get-invitation';

export const GET = publicRoute(getInvitation);
