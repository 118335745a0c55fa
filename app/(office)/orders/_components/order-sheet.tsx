'use client';

import Link from 'next/link';
import { DocumentHead } from '@/components/ui/document-head';
import { YardsFigure } from '@/components/ui/figures';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { Section } from '@/components/ui/section';
import { StatusText } from '@/components/ui/status-text';
import { Moment, WhereProvider } from '@/components/ui/where';
import type { OrderDetail } from '@/lib/contracts/orders';
import { routes } from '@/lib/routes';
import { clockFigure, dayText, decimalFigure } from '@/lib/text/format';
import { orderWords as words } from '@/lib/text/messages/en/jobs';
import { ORDER_LOOKS } from '../../_components/order-table';
import { OrderActions } from './order-actions';

/** An order as the white copy that it is: parties, lines, times, and what was sent of it. */
export function OrderSheet({ order }: { order: OrderDetail }) {
  const { times } = order;
  return (
    <WhereProvider where={times}>
      <DocumentHead
        kind={words.orderTo}
        title={order.supplierName}
        facts={[
          {
            label: words.columns.number,
            value: (
              <>
                <span className="font-code">{order.number}</span>
                {order.version > 1 && `, ${words.version(order.version)}`}
              </>
            ),
          },
          {
            label: words.status,
            value: (
              <StatusText look={ORDER_LOOKS[order.status]}>
                {words.statuses[order.status]}
              </StatusText>
            ),
          },
          ...(order.supplierReference
            ? [
                {
                  label: words.theirNumber,
                  value: <span className="font-code">{order.supplierReference}</span>,
                },
              ]
            : []),
        ]}
        figures={[
          { label: words.orderedYards, value: <YardsFigure value={order.orderedYd3} /> },
          { label: words.deliveredSoFar, value: <YardsFigure value={order.deliveredYd3} /> },
        ]}
        actions={<OrderActions order={order} />}
      />
      <dl className="grid gap-x-10 gap-y-2 px-4 py-4 sm:grid-cols-2 md:px-6 lg:grid-cols-4">
        <Fact label={words.job}>
          <Link href={routes.job(order.jobId)}>
            {order.jobNumber} {order.jobName}
          </Link>
          {order.jobAddress && <span className="block text-ink-soft">{order.jobAddress}</span>}
        </Fact>
        <Fact label={words.placement}>
          {order.placementId ? (
            <Link href={routes.placement(order.placementId)}>{order.placementName}</Link>
          ) : (
            words.noPlacement
          )}
        </Fact>
        <Fact label={words.pourDate}>{dayText(order.pourDate)}</Fact>
        <Fact label={words.firstTruckAt}>
          {order.firstTruckAt === null ? '–' : clockFigure(order.firstTruckAt, times.clock)}
          {order.spacingMinutes !== null && `, ${words.spacingText(order.spacingMinutes)}`}
        </Fact>
      </dl>
      <RuledTable caption={words.lines} className="max-w-4xl">
        <thead>
          <tr>
            <Th>{words.code}</Th>
            <Th>{words.description}</Th>
            <Th align="right">{words.quantity}</Th>
            <Th>{words.unit}</Th>
          </tr>
        </thead>
        <tbody>
          {order.lines.map((line) => (
            <tr key={`${line.code} ${line.quantity} ${line.description}`}>
              <Td className="font-code">{line.code}</Td>
              <Td>{line.description || '–'}</Td>
              <Td align="right">{decimalFigure(line.quantity)}</Td>
              <Td>{line.unit}</Td>
            </tr>
          ))}
        </tbody>
      </RuledTable>
      {order.notes && (
        <p className="max-w-2xl px-4 pt-4 whitespace-pre-wrap md:px-6">
          <span className="block text-xs text-ink-soft">{words.notes}</span>
          {order.notes}
        </p>
      )}
      <p className="px-4 pt-4 text-[14.5px] md:px-6">
        <Link
          href={
            order.placementId
              ? `${routes.tickets()}?placementId=${order.placementId}`
              : `${routes.tickets()}?jobId=${order.jobId}`
          }
        >
          {words.tickets}
        </Link>
      </p>
      <Section title={words.versions}>
        {order.versions.length === 0 ? (
          <p className="text-ink-soft">{words.noVersions}</p>
        ) : (
          <ol className="grid max-w-3xl gap-3">
            {order.versions.map((one) => (
              <li key={one.version} className="border-l-[5px] border-cured pl-3 text-[14.5px]">
                <strong className="font-semibold first-letter:uppercase">
                  {words.version(one.version)}
                </strong>
                , <Moment at={one.sentAt} />
                <span className="block text-ink-soft">
                  {[
                    dayText(one.pourDate),
                    one.firstTruckAt === null ? null : clockFigure(one.firstTruckAt, times.clock),
                    one.spacingMinutes === null ? null : words.spacingText(one.spacingMinutes),
                    ...one.lines,
                    one.notes || null,
                  ]
                    .filter(Boolean)
                    .join(' · ')}
                </span>
              </li>
            ))}
          </ol>
        )}
      </Section>
    </WhereProvider>
  );
}

function Fact({ label, children }: { label: string; children: React.ReactNode }) {
  return (
    <div>
      <dt className="text-xs tracking-wide text-ink-soft">{label}</dt>
      <dd>{children}</dd>
    </div>
  );
}
