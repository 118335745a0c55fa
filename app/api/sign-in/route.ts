import { publicRoute } from '@/lib/http/public-route';
import { signIn } from '@/lib/services/auth/sign-in';

export const POST = publicRoute(signIn);
