import { route } from '@/lib/http/route';
import { endOtherSessions } from '@/lib/services/account/end-other-sessions';

export const DELETE = route(endOtherSessions);
