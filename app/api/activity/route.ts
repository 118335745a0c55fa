import { route } from '@/lib/http/route';
import { listActivity } from '@/lib/services/activity/list-activity';

export const GET = route(listActivity);
