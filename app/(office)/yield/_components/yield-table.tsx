'use client';

import Link from 'next/link';
import { Fragment, type ReactNode, useState } from 'react';
import type { useListFilter } from '@/components/shell/use-list-filter';
import { classNames } from '@/components/ui/class-names';
import { YardsFigure } from '@/components/ui/figures';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { SortHead } from '@/components/ui/sort-head';
import type { YieldAnswer, YieldFigures, YieldJob } from '@/lib/contracts/yield';
import { routes } from '@/lib/routes';
import {
  dayText,
  decimalFigure,
  differenceFigure,
  moneyFigure,
  percentFigure,
  signOf,
} from '@/lib/text/format';
import { yieldWords as words } from '@/lib/text/messages/en/yield';

interface YieldTableProps {
  data: YieldAnswer;
  filter: ReturnType<typeof useListFilter>;
}

/** On a phone a row is a slip of two columns: what is over and what it cost come first. */
const ON_PHONE =
  '[&_td]:whitespace-nowrap [&_tr]:max-md:grid! [&_tr]:max-md:grid-cols-2 [&_td]:max-md:order-3 [&_td:first-child]:max-md:order-1 [&_td:first-child]:max-md:col-span-2';
const FIRST_ON_PHONE = 'max-md:order-2!';

/** Jobs with their figures; each unfolds into its placements, each leads to its tickets. */
export function YieldTable({ data, filter }: YieldTableProps) {
  const [openId, setOpenId] = useState<string | null>(null);
  const head = { filter, standard: 'overrun' };
  return (
    <RuledTable caption={words.list} slipsOnPhone className={ON_PHONE}>
      <thead>
        <tr>
          <SortHead sort="job" {...head}>
            {words.columns.job}
          </SortHead>
          <Explained says={words.explain.figured}>{words.columns.figured}</Explained>
          <Explained says={words.explain.ordered} copy="ordered">
            {words.columns.ordered}
          </Explained>
          <SortHead sort="delivered" align="right" copy="delivered" {...head}>
            <span title={words.explain.delivered}>{words.columns.delivered}</span>
          </SortHead>
          <Explained says={words.explain.billed} copy="billed">
            {words.columns.billed}
          </Explained>
          <SortHead sort="overrun" align="right" {...head}>
            <span title={words.explain.overrun}>{words.columns.overrun}</span>
          </SortHead>
          <Explained says={words.explain.thickness}>{words.columns.thickness}</Explained>
          <SortHead sort="waiting" align="right" {...head}>
            <span title={words.explain.waiting}>{words.columns.waiting}</span>
          </SortHead>
          <SortHead sort="cost" align="right" {...head}>
            <span title={words.explain.cost}>{words.columns.cost}</span>
          </SortHead>
        </tr>
      </thead>
      <tbody>
        {data.rows.map((row) => (
          <Fragment key={row.jobId}>
            <tr className="hover:bg-band">
              <Td>
                <JobCell
                  row={row}
                  open={row.jobId === openId}
                  onToggle={() => setOpenId(row.jobId === openId ? null : row.jobId)}
                />
              </Td>
              <Figures of={row} name={row.jobName} />
            </tr>
            {row.jobId === openId &&
              row.placements.map((one) => (
                <tr key={one.placementId} className="bg-band text-[13.5px]">
                  <Td>
                    <span className="block pl-5">
                      {one.name}
                      <span className="block text-[12.5px] text-ink-soft">
                        {dayText(one.pourDate)} · {words.loads(one.loads)} ·{' '}
                        <Link href={`${routes.tickets()}?placementId=${one.placementId}`}>
                          {words.tickets}
                        </Link>
                        {one.smallSample && <FewLoads />}
                      </span>
                    </span>
                  </Td>
                  <Figures of={one} name={one.name} />
                </tr>
              ))}
          </Fragment>
        ))}
      </tbody>
      <tfoot>
        <tr>
          <Td>{words.total}</Td>
          <Figures of={data.totals} name={words.total} />
        </tr>
      </tfoot>
    </RuledTable>
  );
}

interface ExplainedProps {
  says: string;
  copy?: 'ordered' | 'billed';
  children: string;
}

function Explained({ says, copy, children }: ExplainedProps) {
  return (
    <Th align="right" title={says} {...(copy ? { copy } : {})}>
      {children}
    </Th>
  );
}

interface JobCellProps {
  row: YieldJob;
  open: boolean;
  onToggle: () => void;
}

function JobCell({ row, open, onToggle }: JobCellProps) {
  return (
    <>
      <button
        type="button"
        aria-expanded={open}
        onClick={onToggle}
        className="inline-flex min-h-9 items-baseline md:min-h-6 gap-1.5 text-left font-semibold text-carbon"
      >
        <span aria-hidden>{open ? '▾' : '▸'}</span>
        {row.jobName}
      </button>
      <span className="block pl-5 text-[12.5px] text-ink-soft">
        {row.jobNumber} · {words.loads(row.loads)} ·{' '}
        <Link href={`${routes.tickets()}?jobId=${row.jobId}`}>{words.tickets}</Link>
        {row.smallSample && <FewLoads />}
      </span>
    </>
  );
}

interface CellProps {
  label: string;
  copy?: 'ordered' | 'delivered' | 'billed';
  className?: string;
  children: ReactNode;
}

/** A figure under its column's head; on a phone, where there is none, under its own. */
function Cell({ label, copy, className, children }: CellProps) {
  return (
    <Td align="right" className={className} {...(copy ? { copy } : {})}>
      <span className="block text-[12.5px] font-normal text-ink-soft md:hidden">{label}</span>
      {children}
    </Td>
  );
}

function Figures({ of: row, name }: { of: YieldFigures; name: string }) {
  const { columns } = words;
  return (
    <>
      <Cell label={columns.figured}>
        <YardsFigure value={row.figuredYd3} unit={false} />
      </Cell>
      <Cell label={columns.ordered} copy="ordered">
        <YardsFigure value={row.orderedYd3} unit={false} />
      </Cell>
      <Cell label={columns.delivered} copy="delivered">
        <YardsFigure value={row.deliveredYd3} unit={false} />
        {signOf(row.returnedYd3) !== 'zero' && (
          <Small>{words.returned(decimalFigure(row.returnedYd3))}</Small>
        )}
      </Cell>
      <Cell label={columns.billed} copy="billed">
        <YardsFigure value={row.billedYd3} unit={false} />
      </Cell>
      <Cell label={columns.overrun} className={FIRST_ON_PHONE}>
        <Overrun row={row} />
      </Cell>
      <Cell label={columns.thickness}>
        {row.impliedThicknessIn === null ? '–' : decimalFigure(row.impliedThicknessIn)}
        {row.plannedThicknessIn !== null && (
          <Small>{words.planned(decimalFigure(row.plannedThicknessIn))}</Small>
        )}
      </Cell>
      <Cell label={columns.waiting}>
        {row.minutesPerLoad === null
          ? '–'
          : words.minutesPerLoad(decimalFigure(row.minutesPerLoad, 0))}
        {row.minutesPerYd3 !== null && (
          <Small>{words.minutesPerYard(decimalFigure(row.minutesPerYd3, 1))}</Small>
        )}
      </Cell>
      <Cell label={columns.cost} className={FIRST_ON_PHONE}>
        <Cost row={row} name={name} />
      </Cell>
    </>
  );
}

function FewLoads() {
  return <span title={words.smallSays}> · {words.small}</span>;
}

function Small({ children }: { children: ReactNode }) {
  return <span className="block text-[12.5px] text-ink-soft">{children}</span>;
}

function Overrun({ row }: { row: YieldFigures }) {
  if (row.overrunShare === null || row.overrunYd3 === null) return '–';
  const over = signOf(row.overrunYd3) === 'positive';
  return (
    <span className={classNames(over && 'font-semibold text-keel')}>
      {over && '+'}
      {percentFigure(row.overrunShare, 1)}
      <Small>{`${differenceFigure(row.overrunYd3)} yd³`}</Small>
    </span>
  );
}

/** The cost a yard; what it is made of unfolds, a yard and in all. */
function Cost({ row, name }: { row: YieldFigures; name: string }) {
  const without = row.unpriced > 0 && (
    <Small>
      <span title={words.unpricedSays}>{words.unpriced(row.unpriced)}</span>
    </Small>
  );
  if (row.costPerYd3 === null) return <>–{without}</>;
  return (
    <details>
      <summary aria-label={words.costOf(name)} className="list-none">
        <span className="font-semibold">{moneyFigure(row.costPerYd3)}</span>{' '}
        <span className="text-ink-soft">{words.columns.perYard} ▾</span>
        {row.costFrom !== 'billed' && <Small>{words.sources[row.costFrom]}</Small>}
        {without}
      </summary>
      <CostParts row={row} />
    </details>
  );
}

function CostParts({ row }: { row: YieldFigures }) {
  const lines = [
    ...row.costParts.map(({ part, perYd3, amount }) => ({
      name: words.parts[part],
      perYd3,
      amount,
    })),
    { name: words.total, perYd3: row.costPerYd3, amount: row.cost },
  ];
  return (
    <dl className="mt-1 border-t border-wet pt-1 text-[13px] font-normal last:*:font-semibold">
      {lines.map(({ name, perYd3, amount }) => (
        <div key={name} className="grid grid-cols-[1fr_5rem_6rem]">
          <dt className="text-left text-ink-soft">{name}</dt>
          <dd>{perYd3 === null ? '–' : moneyFigure(perYd3)}</dd>
          <dd>{moneyFigure(amount)}</dd>
        </div>
      ))}
    </dl>
  );
}
