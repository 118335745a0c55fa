'use client';

import dynamic from 'next/dynamic';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useCallback, useMemo, useRef, useState } from 'react';
import type { Sheet, SheetRow } from '@/lib/contracts/sheet';
import { routes } from '@/lib/routes';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { useRefreshedFindings } from '../shell/use-refreshed-findings';
import { Notice } from '../ui/notice';
import { WhereProvider } from '../ui/where';
import { AcceptDialog } from './accept-dialog';
import { Closing } from './closing';
import { EvidencePanel } from './evidence-panel';
import { Key, KeysDialog } from './keys-dialog';
import { MatchDialog } from './match-dialog';
import { RowActions } from './row-actions';
import { SheetBand } from './sheet-band';
import { SheetHead } from './sheet-head';
import { SheetSlips } from './sheet-slips';
import { SheetTools } from './sheet-tools';
import { canBeStruck, rowsShown, SHEET_VIEWS, type SheetView, sumsOf } from './sums';
import { useSheet } from './use-sheet';
import { useSheetKeys } from './use-sheet-keys';
import { useWide } from './use-wide';

const LedgerGrid = dynamic(() => import('../grid/sheet-grid').then((part) => part.SheetGrid), {
  ssr: false,
});

interface SheetScreenProps {
  first: Sheet;
  me: string;
  mayReopen: boolean;
  /** The row that a link asks for. */
  startKey: string | null;
}

type DialogName = 'accept' | 'match' | 'keys';

/** The strike-off sheet: what was ordered, delivered and billed, row by row, to be settled. */
export function SheetScreen({ first, me, mayReopen, startKey }: SheetScreenProps) {
  const router = useRouter();
  const wide = useWide();
  const actions = useSheet(first, me);
  const sheet = actions.sheet ?? first;
  const statementId = sheet.statement.id;
  const isOpen = sheet.statement.status === 'open';
  const refreshed = useRefreshedFindings(isOpen && !first.upToDate, statementId);
  const [view, setView] = useState<SheetView>('all');
  const [search, setSearch] = useState('');
  const [dialog, setDialog] = useState<DialogName | null>(null);
  const [chosenKey, setChosenKey] = useState<string | null>(
    () => startKey ?? first.rows.find((row) => row.settled === null)?.key ?? null,
  );
  const order = useRef<readonly string[]>([]);
  const searchField = useRef<HTMLInputElement>(null);

  const rows = useMemo(() => rowsShown(sheet.rows, view, search), [sheet.rows, view, search]);
  const sums = useMemo(() => sumsOf(sheet.rows), [sheet.rows]);
  const byKey = useMemo(() => new Map(sheet.rows.map((row) => [row.key, row])), [sheet.rows]);
  const chosen = chosenKey === null ? null : (byKey.get(chosenKey) ?? null);

  const keepOrder = useCallback((keys: readonly string[]) => {
    order.current = keys;
  }, []);

  /** The next row after the chosen one that `wanted` lets through, from the top again at the end. */
  const goTo = useCallback(
    (wanted: (row: SheetRow) => boolean) => {
      const keys = order.current.length > 0 ? order.current : rows.map((row) => row.key);
      const at = keys.indexOf(chosenKey ?? '');
      const around = [...keys.slice(at + 1), ...keys.slice(0, at + 1)];
      const next = around.find((key) => {
        const row = byKey.get(key);
        return row !== undefined && key !== chosenKey && wanted(row);
      });
      if (next !== undefined) setChosenKey(next);
    },
    [byKey, chosenKey, rows],
  );
  const goToNextOpen = () => goTo((row) => row.settled === null);

  const canAct = isOpen && chosen !== null && chosen.settled === null;
  function strike() {
    if (!canAct) return goToNextOpen();
    if (!canBeStruck(chosen)) return actions.say(words.cannotStrike);
    void actions.settle('struck', [chosen.key]);
    goToNextOpen();
  }
  function claim() {
    if (!canAct || chosen.verdict !== 'finding') return;
    void actions.settle('claimed', [chosen.key]);
    goToNextOpen();
  }
  async function accept(reason: string): Promise<boolean> {
    if (!canAct) return false;
    const done = await actions.settle('accepted', [chosen.key], { reason });
    if (done) goToNextOpen();
    return done;
  }
  const strikeAll = () => {
    if (isOpen) void actions.settle('struck', sums.strikeable);
  };
  const openAgain = () => {
    if (isOpen && chosen?.settled) void actions.unsettle([chosen.key]);
  };
  const canMatch = isOpen && chosen?.kind === 'charge' && chosen.settled === null;

  useSheetKeys({
    space: strike,
    'shift s': strikeAll,
    c: claim,
    a: () => {
      if (canAct && !canBeStruck(chosen)) setDialog('accept');
    },
    m: () => {
      if (canMatch) setDialog('match');
    },
    o: openAgain,
    u: () => {
      if (isOpen) void actions.undo();
    },
    n: () => goTo((row) => row.settled === null && row.findings.length > 0),
    f: () => {
      const at = SHEET_VIEWS.indexOf(view);
      setView(SHEET_VIEWS[(at + 1) % SHEET_VIEWS.length] ?? 'all');
    },
    t: () => {
      const [delivery] = chosen?.deliveries ?? [];
      if (delivery?.kind === 'ticket') router.push(routes.ticket(delivery.id));
      if (delivery?.kind === 'pumpTicket') router.push(routes.pumpTicket(delivery.id));
    },
    '/': () => searchField.current?.focus(),
    '?': () => setDialog('keys'),
    'shift ?': () => setDialog('keys'),
  });

  const rowActions = chosen && isOpen && (
    <RowActions
      row={chosen}
      onStrike={strike}
      onClaim={claim}
      onAccept={() => setDialog('accept')}
      onMatch={() => setDialog('match')}
      onOpenAgain={openAgain}
    />
  );
  return (
    <WhereProvider where={sheet.times}>
      <div className="flex min-h-0 flex-1 flex-col min-[900px]:h-0 min-[900px]:min-h-[34rem]">
        <SheetHead
          statement={sheet.statement}
          sums={sums}
          actions={
            <Closing
              statementId={statementId}
              status={sheet.statement.status}
              ready={sums.settled === sums.rows}
              mayReopen={mayReopen}
              onChanged={actions.reload}
            />
          }
        />
        <SheetBand sums={sums} />
        <Remarks
          problem={actions.problem}
          said={actions.said ?? (refreshed ? words.changed : null)}
          ticketsToCheck={sheet.ticketsToCheck}
          supplierId={sheet.statement.supplierId}
        />
        <SheetTools
          view={view}
          onView={setView}
          search={search}
          onSearch={setSearch}
          searchRef={searchField}
          strikeable={isOpen ? sums.strikeable.length : 0}
          onStrikeAll={strikeAll}
          exportHref={`/api/statements/${statementId}/export`}
        />
        <div className="min-h-0 flex-1 min-[900px]:grid min-[900px]:grid-cols-[minmax(0,1fr)_19rem]">
          {wide === true && (
            <LedgerGrid
              label={`${words.kind} ${sheet.statement.supplierName}`}
              rows={rows}
              selectedKey={chosenKey}
              onSelect={setChosenKey}
              onOrder={keepOrder}
              noRows={words.noRows}
            />
          )}
          {wide === false && (
            <SheetSlips
              rows={rows}
              selectedKey={chosenKey}
              onSelect={setChosenKey}
              detail={<EvidencePanel row={chosen} actions={rowActions} />}
            />
          )}
          {wide === true && (
            <aside
              aria-label={words.why}
              className="min-h-0 overflow-y-auto border-l-2 border-dotted border-wet bg-sheet"
            >
              <EvidencePanel row={chosen} actions={rowActions} />
            </aside>
          )}
        </div>
        <Foot onKeys={() => setDialog('keys')} />
      </div>
      <AcceptDialog open={dialog === 'accept'} onClose={() => setDialog(null)} onAccept={accept} />
      <MatchDialog
        statementId={statementId}
        row={dialog === 'match' ? chosen : null}
        onClose={() => setDialog(null)}
        actions={actions}
      />
      <KeysDialog open={dialog === 'keys'} onClose={() => setDialog(null)} />
    </WhereProvider>
  );
}

interface RemarksProps {
  problem: string | null;
  said: string | null;
  ticketsToCheck: number;
  supplierId: string;
}

function Remarks({ problem, said, ticketsToCheck, supplierId }: RemarksProps) {
  return (
    <>
      {problem && (
        <Notice tone="error" className="mx-4 my-2 md:mx-6">
          {problem}
        </Notice>
      )}
      {said && !problem && (
        <Notice tone="info" className="mx-4 my-2 md:mx-6">
          {said}
        </Notice>
      )}
      {ticketsToCheck > 0 && (
        <Notice tone="warning" className="mx-4 my-2 md:mx-6">
          {words.ticketsToCheck(ticketsToCheck)}{' '}
          <Link href={`${routes.tickets()}?status=toCheck&supplierId=${supplierId}`}>
            {words.checkThem}
          </Link>
        </Notice>
      )}
    </>
  );
}

const FOOT_KEYS = [
  ['space', words.strike],
  ['c', words.claim],
  ['a', words.accept],
  ['m', words.match],
  ['u', words.undo],
] as const;

function Foot({ onKeys }: { onKeys: () => void }) {
  return (
    <footer
      data-no-print
      className="hidden shrink-0 flex-wrap items-center gap-x-6 gap-y-1 border-t border-cured bg-band px-6 py-1.5 text-[13px] text-ink-soft min-[900px]:flex"
    >
      {FOOT_KEYS.map(([key, does]) => (
        <span key={key}>
          <Key>{key}</Key> {does.toLowerCase()}
        </span>
      ))}
      <button type="button" onClick={onKeys} className="text-carbon">
        <Key>?</Key> {words.keys.toLowerCase()}
      </button>
    </footer>
  );
}
