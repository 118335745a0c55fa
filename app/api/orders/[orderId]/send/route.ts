import { route } from '@/lib/http/route';
import { sendOrder } from '@/lib/services/orders/send-order';

export const POST = route(sendOrder);
