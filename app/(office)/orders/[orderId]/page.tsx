import type { Metadata } from 'next';
import { ask, requirePage } from '@/lib/http/page';
import { getOrder } from '@/lib/services/orders/get-order';
import { orderWords as words } from '@/lib/text/messages/en/jobs';
import { OrderSheet } from '../_components/order-sheet';

export const metadata: Metadata = { title: words.title };

export default async function OrderPage({ params }: { params: Promise<{ orderId: string }> }) {
  const actor = await requirePage('orders.read');
  const { orderId } = await params;
  const order = await ask(getOrder, actor, { orderId });
  return <OrderSheet order={order} />;
}
