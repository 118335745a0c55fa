'use client';

import type { ReactNode } from 'react';
import type { SheetRow } from '@/lib/contracts/sheet';
import { dayWithoutYear, decimalFigure, moneyFigure, yardsWithUnit } from '@/lib/text/format';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { classNames } from '../ui/class-names';
import { CopyTag } from '../ui/copy-tag';
import { Difference } from '../ui/figures';
import { findingText } from './finding-text';

interface SheetSlipsProps {
  rows: readonly SheetRow[];
  selectedKey: string | null;
  onSelect: (key: string) => void;
  /** What is known of the chosen row, shown under it. */
  detail: ReactNode;
}

/** The sheet on a phone: each row a slip with its three copies one under the other. */
export function SheetSlips({ rows, selectedKey, onSelect, detail }: SheetSlipsProps) {
  if (rows.length === 0) return <p className="px-4 py-6 text-ink-soft">{words.noRows}</p>;
  return (
    <ul aria-label={words.groups.finding}>
      {rows.map((row) => (
        <li key={row.key} className="border-b border-cured">
          <button
            type="button"
            aria-pressed={row.key === selectedKey}
            onClick={() => onSelect(row.key)}
            className={classNames(
              'block w-full px-4 py-2.5 text-left text-[14px]',
              row.key === selectedKey && 'bg-band',
              row.settled && 'strike-line text-ink-soft',
            )}
          >
            <span className="flex items-baseline justify-between gap-3">
              <span className={classNames(row.verdict === 'finding' && 'font-semibold')}>
                {findingText(row)}
              </span>
              <Difference value={row.difference} />
            </span>
            <Copies row={row} />
          </button>
          {row.key === selectedKey && <div className="bg-sheet">{detail}</div>}
        </li>
      ))}
    </ul>
  );
}

function Copies({ row }: { row: SheetRow }) {
  const [first] = row.deliveries;
  const { ordered, billed } = row;
  return (
    <span className="mt-1 grid gap-1 text-[13px]">
      {ordered && (
        <span>
          <CopyTag copy="ordered" /> {ordered.jobName}
          {ordered.quantityYd3 && ` · ${yardsWithUnit(ordered.quantityYd3)}`}
        </span>
      )}
      <span>
        <CopyTag copy="delivered" />{' '}
        {first ? (
          <>
            <span className="font-code">{first.number}</span> · {dayWithoutYear(first.date)} ·{' '}
            {yardsWithUnit(first.quantityYd3)}
          </>
        ) : (
          words.noTicket
        )}
      </span>
      <span>
        <CopyTag copy="billed" />{' '}
        {billed
          ? `${billed.description}${billed.quantity ? ` · ${decimalFigure(billed.quantity)}` : ''} · ${moneyFigure(billed.amount)}`
          : words.notOnBill}
      </span>
    </span>
  );
}
