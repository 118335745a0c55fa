import { route } from '@/lib/http/route';
import { cancelOrder } from '@/lib/services/orders/cancel-order';

export const POST = route(cancelOrder);
