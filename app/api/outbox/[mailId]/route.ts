import { route } from '@/lib/http/route';
import { getMail } from '@/lib/services/outbox/get-mail';

export const GET = route(getMail);
