import { route } from '@/lib/http/route';
import { confirmOrder } from '@/lib/services/orders/confirm-order';

export const POST = route(confirmOrder);
