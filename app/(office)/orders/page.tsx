import type { Metadata } from 'next';
import { listQuery } from '@/components/shell/list-query';
import { LinkButton } from '@/components/ui/button';
import { DocumentHead } from '@/components/ui/document-head';
import { listOrdersInput } from '@/lib/contracts/orders';
import { ask, requirePage } from '@/lib/http/page';
import { routes } from '@/lib/routes';
import { listOrders } from '@/lib/services/orders/list-orders';
import { ticketChoices } from '@/lib/services/tickets/ticket-choices';
import { orderWords as words } from '@/lib/text/messages/en/jobs';
import { OrderList } from './_components/order-list';

export const metadata: Metadata = { title: words.title };

interface PageProps {
  searchParams: Promise<Record<string, string | string[]>>;
}

export default async function OrdersPage({ searchParams }: PageProps) {
  const actor = await requirePage('orders.read');
  const given = listQuery(await searchParams);
  // An address with a filter that makes no sense shows the whole list instead of nothing.
  const query = listOrdersInput.safeParse(given).success ? given : {};
  const first = await ask(listOrders, actor, query);
  const choices = await ask(ticketChoices, actor, {});
  return (
    <>
      <DocumentHead
        kind={words.kind}
        title={words.title}
        actions={
          <LinkButton variant="primary" href={routes.newOrder()}>
            {words.add}
          </LinkButton>
        }
      />
      <OrderList first={first} firstQuery={query} choices={choices} />
    </>
  );
}
