import Link from 'next/link';
import { YardsFigure } from '@/components/ui/figures';
import { OnSlip } from '@/components/ui/on-slip';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { StatusText } from '@/components/ui/status-text';
import type { PlacementRow } from '@/lib/contracts/placements';
import { routes } from '@/lib/routes';
import { dayText } from '@/lib/text/format';
import { jobWords, placementWords as words } from '@/lib/text/messages/en/jobs';

const LOOKS = { planned: 'waiting', poured: 'done', cancelled: 'off' } as const;

interface PlacementTableProps {
  rows: readonly PlacementRow[];
  empty: string;
}

/** A job's pours with the three copies of their yards. */
export function PlacementTable({ rows, empty }: PlacementTableProps) {
  if (rows.length === 0) return <p className="px-4 pb-4 text-ink-soft md:px-6">{empty}</p>;
  const { columns } = jobWords;
  return (
    <RuledTable caption={jobWords.placements} slipsOnPhone>
      <thead>
        <tr>
          <Th>{words.day}</Th>
          <Th>{words.kind}</Th>
          <Th align="right">{columns.figured}</Th>
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
              <Link href={routes.placement(row.id)} className="font-semibold">
                {row.name}
              </Link>
              <span className="block text-[13px] text-ink-soft">{words.elements[row.element]}</span>
            </Td>
            <Td align="right">
              <OnSlip>{columns.figured}</OnSlip>
              <YardsFigure value={row.figuredYd3} />
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
              <StatusText look={LOOKS[row.status]}>{words.statuses[row.status]}</StatusText>
            </Td>
          </tr>
        ))}
      </tbody>
    </RuledTable>
  );
}
