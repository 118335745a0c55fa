'use client';

import Link from 'next/link';
import type { ReactNode } from 'react';
import type { SheetFinding, SheetRow } from '@/lib/contracts/sheet';
import { routes } from '@/lib/routes';
import { decimalFigure, differenceFigure, moneyFigure } from '@/lib/text/format';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { varianceKinds } from '@/lib/text/messages/en/variance-kinds';
import { Moment } from '../ui/where';
import { findingText } from './finding-text';
import { TicketEvidence } from './ticket-evidence';

interface EvidencePanelProps {
  row: SheetRow | null;
  actions: ReactNode;
}

/** Why a row is as it is: its finding, its ticket with the photo, the arithmetic, the match. */
export function EvidencePanel({ row, actions }: EvidencePanelProps) {
  if (!row) return <p className="px-4 py-5 text-ink-soft">{words.nothingChosen}</p>;
  return (
    <div className="flex flex-col gap-3 px-4 py-4 text-[14px]">
      <header>
        <h2 className="text-[18px] leading-snug first-letter:uppercase">{findingText(row)}</h2>
        <p className="text-[12.5px] text-ink-soft">{placeText(row)}</p>
      </header>
      <Deliveries row={row} />
      {row.findings.length > 0 ? (
        row.findings.map((finding) => (
          <FindingWhy key={finding.key} finding={finding} several={row.findings.length > 1} />
        ))
      ) : (
        <Why sentence={row.sentence} steps={row.steps} expected={row.expected} />
      )}
      {row.match && (
        <p className="text-[12.5px] text-ink-soft">
          {words.methods[row.match.method]}
          {row.match.method !== 'hand' && `: ${row.match.reason}`}
        </p>
      )}
      {row.settled && (
        <p className="border-l-[5px] border-moss pl-2.5 text-[13.5px]">
          <span className="first-letter:uppercase">
            {words.states[row.settled.state]} by {row.settled.by}
          </span>
          , <Moment at={row.settled.at} />
          {row.settled.reason && <span className="block">“{row.settled.reason}”</span>}
        </p>
      )}
      {actions}
    </div>
  );
}

function placeText(row: SheetRow): string {
  const { billed } = row;
  return billed
    ? words.billLine(billed.position, billed.sourceLine, billed.invoiceNumber)
    : row.kind === 'unbilled'
      ? words.notOnBill
      : '';
}

function Deliveries({ row }: { row: SheetRow }) {
  const [first, ...rest] = row.deliveries;
  if (!first) return null;
  return (
    <>
      <ul className="text-[13.5px]">
        {row.deliveries.slice(0, 8).map((one) => (
          <li key={one.id}>
            <Link
              href={one.kind === 'ticket' ? routes.ticket(one.id) : routes.pumpTicket(one.id)}
              className="font-code font-semibold"
            >
              {one.number}
            </Link>{' '}
            <span className="text-ink-soft">
              {[
                one.kind === 'pumpTicket' ? words.pump : null,
                one.truck ? `truck ${one.truck}` : null,
                one.loadNumber ? `load ${one.loadNumber}` : null,
                `${decimalFigure(one.quantityYd3)} yd³`,
              ]
                .filter(Boolean)
                .join(' · ')}
            </span>
          </li>
        ))}
        {rest.length >= 8 && <li className="text-ink-soft">…</li>}
      </ul>
      {row.deliveries.length === 1 && first.kind === 'ticket' && (
        <TicketEvidence ticketId={first.id} about={row.chargeKind} />
      )}
    </>
  );
}

function FindingWhy({ finding, several }: { finding: SheetFinding; several: boolean }) {
  return (
    <section>
      {several && (
        <h3 className="text-[15px]">
          {varianceKinds[finding.kind]} {differenceFigure(finding.difference)}
        </h3>
      )}
      <Why sentence={finding.sentence} steps={finding.steps} expected={finding.expected} />
    </section>
  );
}

interface WhyProps {
  sentence: string;
  steps: SheetRow['steps'];
  expected: string | null;
}

function Why({ sentence, steps, expected }: WhyProps) {
  return (
    <>
      <p>{sentence}</p>
      {(steps.length > 0 || expected !== null) && (
        <dl className="mt-2 border-t border-wet border-b-[3px] border-b-[color:var(--wet)] py-1.5 [border-bottom-style:double]">
          {steps.map((step) => (
            <div key={`${step.label} ${step.value}`} className="flex justify-between gap-3 py-0.5">
              <dt className="text-ink-soft">{step.label}</dt>
              <dd className="text-right">{step.value}</dd>
            </div>
          ))}
          {expected !== null && (
            <div className="flex justify-between gap-3 py-0.5 font-semibold">
              <dt>{words.expected}</dt>
              <dd>{moneyFigure(expected)}</dd>
            </div>
          )}
        </dl>
      )}
    </>
  );
}
