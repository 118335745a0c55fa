import { publicRoute } from '@/lib/http/public-route';
import { signUp } from '@/lib/services/auth/sign-up';

export const POST = publicRoute(signUp);
