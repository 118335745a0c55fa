import { publicRoute } from '@/lib/http/public-route';
import { forgotPassword } from '@/lib/services/auth/forgot-password';

export const POST = publicRoute(forgotPassword);
