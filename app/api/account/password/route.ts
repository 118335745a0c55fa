import { route } from '@/lib/http/route';
import { changePassword } from '@/lib/services/account/change-password';

export const PUT = route(changePassword);
