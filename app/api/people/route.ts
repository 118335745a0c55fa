import { route } from '@/lib/http/route';
import { listPeople } from '@/lib/services/people/list-people';

export const GET = route(listPeople);
