import { route } from '@/lib/http/route';
import { listOutbox } from '@/lib/services/outbox/list-outbox';

export const GET = route(listOutbox);
