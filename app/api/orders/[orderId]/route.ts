import { route } from '@/lib/http/route';
import { getOrder } from '@/lib/services/orders/get-order';
import { updateOrder } from '@/lib/services/orders/update-order';

export const GET = route(getOrder);
export const PUT = route(updateOrder);
