import { publicRoute } from '@/lib/http/public-route';
import { resetPassword } from '@/lib/services/auth/reset-password';

export const POST = publicRoute(resetPassword);
