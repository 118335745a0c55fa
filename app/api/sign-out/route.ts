import { publicRoute } from '@/lib/http/public-route';
import { signOut } from '@/lib/services/auth/sign-out';

export const POST = publicRoute(signOut);
