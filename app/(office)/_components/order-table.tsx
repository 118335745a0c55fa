import Link from 'next/link';
import { YardsFigure } from '@/components/ui/figures';
import { OnSlip } from '@/components/ui/on-slip';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { StatusText } from '@/components/ui/status-text';
import type { OrderRow } from '@/lib/contracts/orders';
import { routes } from '@/lib/routes';
import { dayText } from '@/lib/text/format';
import { orderWords as words } from '@/lib/text/messages/en/jobs';

export const ORDER_LOOKS = {
  draft: 'quiet',
  sent: 'waiting',
  confirmed: 'done',
  cancelled: 'off',
} as const;

interface OrderTableProps {
  rows: readonly OrderRow[];
  empty: string;
}

/** Orders with what has come of them. */
export function OrderTable({ rows, empty }: OrderTableProps) {
  if (rows.length === 0) return <p className="px-4 pb-4 text-ink-soft md:px-6">{empty}</p>;
  const { columns } = words;
  return (
    <RuledTable caption={words.list} slipsOnPhone>
      <thead>
        <tr>
          <Th>{columns.day}</Th>
          <Th>{columns.number}</Th>
          <Th>{columns.supplier}</Th>
          <Th>{columns.job}</Th>
          <Th align="right" copy="ordered">
            {columns.ordered}
          </Th>
          <Th align="right" copy="delivered">
            {columns.delivered}
          </Th>
          <Th>{columns.status}</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id} className="hover:bg-band">
            <Td className="whitespace-nowrap">{dayText(row.pourDate)}</Td>
            <Td>
              <Link href={routes.order(row.id)} className="font-code font-semibold">
                {row.number}
              </Link>
            </Td>
            <Td>{row.supplierName}</Td>
            <Td>
              {row.jobNumber} {row.jobName}
              {row.placementName && (
                <span className="block text-[13px] text-ink-soft">{row.placementName}</span>
              )}
            </Td>
            <Td align="right" copy="ordered">
              <OnSlip>{columns.ordered}</OnSlip>
              <YardsFigure value={row.orderedYd3} />
            </Td>
            <Td align="right" copy="delivered">
              <OnSlip>{columns.delivered}</OnSlip>
              <YardsFigure value={row.deliveredYd3} />
            </Td>
            <Td>
              <StatusText look={ORDER_LOOKS[row.status]}>{words.statuses[row.status]}</StatusText>
            </Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}
