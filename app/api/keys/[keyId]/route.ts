import { route } from '@/lib/http/route';
import { revokeKey } from '@/lib/services/keys/revoke-key';

export const DELETE = route(revokeKey);
