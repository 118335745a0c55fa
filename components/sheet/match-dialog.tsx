'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Candidate, SheetRow } from '@/lib/contracts/sheet';
import { candidatesQuery } from '@/lib/queries/statements';
import { dayWithoutYear, yardsWithUnit } from '@/lib/text/format';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { Button } from '../ui/button';
import { Dialog } from '../ui/dialog';
import { useCommon } from '../ui/locale';
import { SearchField } from '../ui/search-field';
import type { SheetActions } from './use-sheet';

interface MatchDialogProps {
  statementId: string;
  row: SheetRow | null;
  onClose: () => void;
  actions: Pick<SheetActions, 'matchTo' | 'unmatch'>;
}

/** A person's own word on which deliveries a billed line is for. */
export function MatchDialog({ statementId, row, onClose, actions }: MatchDialogProps) {
  return (
    <Dialog open={row !== null} onClose={onClose} title={words.matchTitle}>
      {row?.billed && (
        <Choices
          key={row.key}
          statementId={statementId}
          row={row}
          lineId={row.billed.lineId}
          onClose={onClose}
          actions={actions}
        />
      )}
    </Dialog>
  );
}

interface ChoicesProps extends Omit<MatchDialogProps, 'row'> {
  row: SheetRow;
  lineId: string;
}

function Choices({ statementId, row, lineId, onClose, actions }: ChoicesProps) {
  const common = useCommon();
  const [search, setSearch] = useState('');
  const [chosen, setChosen] = useState<ReadonlyMap<string, Candidate['kind']>>(
    () => new Map(row.deliveries.map((one) => [one.id, one.kind])),
  );
  const { data } = useQuery({
    ...candidatesQuery(statementId, lineId, search),
    placeholderData: keepPreviousData,
  });
  const act = async (work: () => Promise<boolean>) => {
    if (await work()) onClose();
  };
  const toggle = (one: Candidate) => {
    const next = new Map(chosen);
    if (!next.delete(one.id)) next.set(one.id, one.kind);
    setChosen(next);
  };
  return (
    <div className="flex flex-col gap-3">
      <p className="text-[14px]">
        {row.billed?.description}
        {row.billed?.ticketNumber && <span className="font-code"> {row.billed.ticketNumber}</span>}
      </p>
      <SearchField label={words.matchSearch} value={search} onSearch={setSearch} />
      <ul className="max-h-[38dvh] overflow-y-auto border-y border-wet">
        {!data && <li className="p-3 text-ink-soft">{common.loading}</li>}
        {data?.rows.length === 0 && <li className="p-3 text-ink-soft">{words.matchEmpty}</li>}
        {data?.rows.map((one) => (
          <li key={one.id} className="border-b border-cured last:border-0">
            <label className="flex min-h-11 items-start gap-3 px-1 py-1.5">
              <input
                type="checkbox"
                className="mt-1 size-5 accent-carbon"
                checked={chosen.has(one.id)}
                onChange={() => toggle(one)}
              />
              <CandidateText candidate={one} />
            </label>
          </li>
        ))}
      </ul>
      <div className="flex flex-wrap gap-2">
        <Button
          disabled={chosen.size === 0}
          onClick={() =>
            act(() =>
              actions.matchTo(
                lineId,
                [...chosen].map(([id, kind]) => ({ id, kind })),
              ),
            )
          }
        >
          {words.matchDo}
        </Button>
        <Button variant="quiet" onClick={() => act(() => actions.unmatch(lineId, 'nothing'))}>
          {words.matchNone}
        </Button>
        {row.match?.method === 'hand' && (
          <Button variant="quiet" onClick={() => act(() => actions.unmatch(lineId, 'engine'))}>
            {words.matchEngine}
          </Button>
        )}
        <Button variant="quiet" onClick={onClose}>
          {common.cancel}
        </Button>
      </div>
    </div>
  );
}

function CandidateText({ candidate: one }: { candidate: Candidate }) {
  return (
    <span className="min-w-0 flex-1 text-[14px]">
      <span className="font-code font-semibold">{one.number}</span> · {dayWithoutYear(one.date)} ·{' '}
      {yardsWithUnit(one.quantityYd3)}
      {one.truck && ` · truck ${one.truck}`}
      <span className="block text-[13px] text-ink-soft">
        {[
          one.jobName,
          ...one.reasons.map((reason) => words.reasons[reason]),
          one.tiedLines > 0 ? words.tied(one.tiedLines) : null,
        ]
          .filter(Boolean)
          .join(' · ')}
      </span>
    </span>
  );
}
