import { route } from '@/lib/http/route';
import { createOrder } from '@/lib/services/orders/create-order';
import { listOrders } from '@/lib/services/orders/list-orders';

export const GET = route(listOrders);
export const POST = route(createOrder);
