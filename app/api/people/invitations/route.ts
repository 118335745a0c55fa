import { route } from '@/lib/http/route';
import { invitePerson } from '@/lib/services/people/invite-person';

export const POST = route(invitePerson);
