import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { DocumentHead } from '@/components/ui/document-head';
import { ask, requirePage } from '@/lib/http/page';
import { getOrder } from '@/lib/services/orders/get-order';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { orderWords as words } from '@/lib/text/messages/en/jobs';
import { OrderForm } from '../../_components/order-form';
import { formOfOrder } from '../../_components/order-form-schema';

export const metadata: Metadata = { title: words.change };

export default async function EditOrderPage({ params }: { params: Promise<{ orderId: string }> }) {
  const actor = await requirePage('orders.write');
  const { orderId } = await params;
  const order = await ask(getOrder, actor, { orderId });
  if (order.status === 'cancelled') notFound();
  const choices = await ask(ticketChoices, actor, {});
  return (
    <>
      <DocumentHead kind={words.kind} title={words.editTitle(order.number)} />
      <OrderForm order={order} start={formOfOrder(order)} choices={choices} />
    </>
  );
}
