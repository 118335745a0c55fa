import { fileRoute } from '@/lib/http/route';
import { exportOrders } from '@/lib/services/orders/export-orders';

export const GET = fileRoute(exportOrders);
