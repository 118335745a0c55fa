import { publicRoute } from '@/lib/http/public-route';
import { signInHints } from '@/lib/services/auth/sign-in-hints';

export const GET = publicRoute(signInHints);
