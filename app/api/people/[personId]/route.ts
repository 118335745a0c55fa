import { route } from '@/lib/http/route';
import { removePerson } from '@/lib/services/people/remove-person';

export const DELETE = route(removePerson);
