'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import { Section } from '@/components/ui/section';
import type { BillCsvPreview, ImportItem } from '@/importers/core/plan';
import { CHARGE_KINDS, type ChargeKind } from '@/lib/domain/facts';
import { dayText, decimalFigure, moneyFigure, rateFigure } from '@/lib/text/format';
import { sheetWords, preview as words } from '@/lib/text/messages/en/statements';

const SHOWN_FIRST = 50;

interface LineTableProps {
  preview: BillCsvPreview;
  kinds: Readonly<Record<string, ChargeKind>>;
  readOnly: boolean;
  onKind: (rowKey: string, kind: ChargeKind) => void;
}

/** The file's rows as they were read; what a line charges for can be corrected. */
export function LineTable({ preview, kinds, readOnly, onKind }: LineTableProps) {
  const [all, setAll] = useState(false);
  const { items } = preview;
  const shown = all ? items : items.slice(0, SHOWN_FIRST);
  return (
    <Section title={words.lines} bleed>
      <RuledTable caption={words.lines} className="text-[13.5px]">
        <thead>
          <tr>
            <Th align="right">{words.line}</Th>
            <Th>{sheetWords.columns.date}</Th>
            <Th>{sheetWords.columns.ticket}</Th>
            <Th>{sheetWords.columns.job}</Th>
            <Th>{sheetWords.columns.line}</Th>
            <Th>{words.charge}</Th>
            <Th align="right">{sheetWords.columns.quantity}</Th>
            <Th align="right">{sheetWords.columns.rate}</Th>
            <Th align="right" copy="billed">
              {sheetWords.columns.amount}
            </Th>
          </tr>
        </thead>
        <tbody>
          {shown.map((item) => (
            <Line
              key={item.rowKey}
              item={item}
              kind={kinds[item.rowKey] ?? item.chargeKind}
              readOnly={readOnly}
              onKind={(kind) => onKind(item.rowKey, kind)}
            />
          ))}
        </tbody>
      </RuledTable>
      {items.length > shown.length && (
        <p className="flex items-center gap-3 px-4 py-3 text-[14px] text-ink-soft md:px-6">
          {words.shown(shown.length, items.length)}
          <Button variant="quiet" onClick={() => setAll(true)}>
            {words.showAll}
          </Button>
        </p>
      )}
    </Section>
  );
}

interface LineProps {
  item: ImportItem;
  kind: ChargeKind;
  readOnly: boolean;
  onKind: (kind: ChargeKind) => void;
}

function Line({ item, kind, readOnly, onKind }: LineProps) {
  const { values, action } = item;
  const canChoose = action === 'create' && item.rowKind === 'line' && !readOnly;
  return (
    <tr className={classNames(action === 'skip' && 'text-ink-soft')}>
      <Td align="right">{item.sourceLine}</Td>
      <Td className="whitespace-nowrap">{values.date ? dayText(values.date) : '–'}</Td>
      <Td className="font-code">{values.ticketNumber ?? '–'}</Td>
      <Td>{values.jobName ?? '–'}</Td>
      <Td>
        {values.description || item.raw}
        {action === 'error' && (
          <strong className="ml-2 font-semibold text-keel">{words.actions.error}</strong>
        )}
        {item.skipReason && (
          <span className="ml-2 text-[12.5px]">({words.skipReasons[item.skipReason]})</span>
        )}
      </Td>
      <Td>
        {canChoose ? (
          <select
            aria-label={`${words.line} ${item.sourceLine}: ${words.charge}`}
            title={item.chargeReason}
            value={kind}
            onChange={(event) => onKind(event.target.value as ChargeKind)}
            className="min-h-11 border border-cured bg-sheet px-1.5 md:min-h-7"
          >
            {CHARGE_KINDS.map((one) => (
              <option key={one} value={one}>
                {words.charges[one]}
              </option>
            ))}
          </select>
        ) : (
          action === 'create' && words.charges[kind]
        )}
      </Td>
      <Td align="right">{values.quantity ? decimalFigure(values.quantity) : ''}</Td>
      <Td align="right">{values.unitPrice ? rateFigure(values.unitPrice) : ''}</Td>
      <Td align="right" copy="billed">
        {values.amount ? moneyFigure(values.amount) : ''}
      </Td>
    </tr>
  );
}
