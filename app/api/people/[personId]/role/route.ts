import { route } from '@/lib/http/route';
import { changeRole } from '@/lib/services/people/change-role';

export const PUT = route(changeRole);
