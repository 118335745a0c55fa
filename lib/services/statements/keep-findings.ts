import type { StoredMatch, StoredVariance, VarianceValues } from '../../../db/queries/sheet-state';
import {
  deleteStrikes,
  insertVariance,
  type NewMatch,
  replaceEngineMatches,
  strikesOf,
  updateVariance,
  variancesOf,
} from '../../../db/queries/sheet-state';
import type { StoredStatement } from '../../../db/queries/statements';
import type { Scope } from '../../../db/tx';
import type { SheetRow } from '../../contracts/sheet';
import type { MatchResult } from '../../domain/matching/match';
import { moneyText } from '../../domain/money/money';
import type { Finding } from '../../domain/variance/finding';
import type { Reconciliation } from '../../domain/variance/reconcile';
import { reconcile } from '../../domain/variance/reconcile';
import type { CompanySettings } from '../context';
import { loadSheetFacts, type SheetFacts } from './sheet-facts';
import { sheetRows } from './sheet-rows';

/** A statement's sheet worked out from the facts of this moment. */
export interface WorkedOut {
  readonly facts: SheetFacts;
  readonly result: Reconciliation;
  readonly rows: readonly SheetRow[];
  /** Whether the ties, findings and settlements kept in the ledger are these. */
  readonly upToDate: boolean;
}

function matchValues(result: MatchResult): NewMatch[] {
  return result.matches
    .filter(({ method }) => method !== 'hand')
    .map(({ billLineId, delivery, method, confidence, reason }) => ({
      billLineId,
      ticketId: delivery.kind === 'ticket' ? delivery.id : null,
      pumpTicketId: delivery.kind === 'pumpTicket' ? delivery.id : null,
      method,
      confidence,
      reason,
    }));
}

const matchMark = (one: NewMatch | StoredMatch) =>
  JSON.stringify([one.billLineId, one.ticketId, one.pumpTicketId, one.method, one.reason]);

function sameMatches(stored: readonly StoredMatch[], wanted: readonly NewMatch[]): boolean {
  const engine = stored.filter(({ method }) => method !== 'hand').map(matchMark);
  const marks = new Set(engine);
  return engine.length === wanted.length && wanted.every((one) => marks.has(matchMark(one)));
}

function varianceFacts(
  statement: StoredStatement,
  rowKey: string,
  finding: Finding,
): Omit<VarianceValues, 'status' | 'reason' | 'decidedBy' | 'decidedAt'> {
  return {
    supplierId: statement.supplierId,
    statementId: statement.id,
    key: finding.key,
    rowKey,
    kind: finding.kind,
    billLineId: finding.billLineId,
    ticketId: finding.ticketIds[0] ?? null,
    pumpTicketId: finding.pumpTicketIds[0] ?? null,
    clauseId: finding.clauseId,
    expected: moneyText(finding.expected),
    billed: moneyText(finding.billed),
    difference: moneyText(finding.difference),
    sentence: finding.sentence,
    steps: finding.steps.map(({ label, value }) => ({ label, value })),
  };
}

type VarianceChange =
  | { readonly do: 'add'; readonly values: VarianceValues }
  | { readonly do: 'change'; readonly id: string; readonly values: Partial<VarianceValues> };

const UNDECIDED = { reason: '', decidedBy: null, decidedAt: null } as const;

/** What has to happen to the kept variances so that they are the findings of this moment. */
function varianceChanges(
  statement: StoredStatement,
  result: Reconciliation,
  stored: readonly StoredVariance[],
): VarianceChange[] {
  const kept = new Map(stored.map((variance) => [variance.key, variance]));
  const changes: VarianceChange[] = [];
  const seen = new Set<string>();
  for (const line of result.lines) {
    for (const finding of line.findings) {
      seen.add(finding.key);
      const values = varianceFacts(statement, line.key, finding);
      const undecided = finding.withinTolerance ? 'withinTolerance' : 'open';
      const before = kept.get(finding.key);
      if (!before) {
        changes.push({ do: 'add', values: { ...values, ...UNDECIDED, status: undecided } });
        continue;
      }
      const isDecided = before.status === 'accepted' || before.status === 'claimed';
      const holds = isDecided && before.difference === values.difference;
      const status = holds ? before.status : undecided;
      const wanted = { ...values, ...(holds ? {} : UNDECIDED), status };
      if (Object.entries(wanted).some(([name, value]) => !sameValue(before, name, value))) {
        changes.push({ do: 'change', id: before.id, values: wanted });
      }
    }
  }
  for (const variance of stored) {
    if (seen.has(variance.key) || variance.status === 'gone') continue;
    changes.push({ do: 'change', id: variance.id, values: { status: 'gone' } });
  }
  return changes;
}

function sameValue(before: StoredVariance, name: string, value: unknown): boolean {
  const old = before[name as keyof StoredVariance];
  return name === 'steps' ? sameSteps(before.steps, value) : old === value;
}

/** JSON in the database does not keep the order of names. */
function sameSteps(one: StoredVariance['steps'], other: unknown): boolean {
  const text = (steps: StoredVariance['steps']) =>
    JSON.stringify(steps.map(({ label, value }) => [label, value]));
  return text(one) === text(other as StoredVariance['steps']);
}

/** Works the sheet out; reads only. */
export async function workOut(
  scope: Scope,
  statement: StoredStatement,
  company: CompanySettings,
): Promise<WorkedOut> {
  const facts = await loadSheetFacts(scope, statement, company);
  const result = reconcile(facts.input);
  const strikes = await strikesOf(scope, statement.id);
  const stored = await variancesOf(scope, statement.id);
  const rows = sheetRows(facts, result, strikes, stored);
  const settled = new Set(rows.filter((row) => row.settled).map((row) => row.key));
  return {
    facts,
    result,
    rows,
    upToDate:
      sameMatches(facts.storedMatches, matchValues(result.matchResult)) &&
      varianceChanges(statement, result, stored).length === 0 &&
      strikes.every((strike) => settled.has(strike.rowKey)),
  };
}

/** What keeping a sheet's findings came to. */
export interface Kept {
  readonly changed: boolean;
  /** Keys of the rows that it opened again. */
  readonly reopened: readonly string[];
  readonly rows: readonly SheetRow[];
}

/**
 * Works the sheet out and keeps its ties and findings in the ledger. A person's decision outlives
 * it unless what was decided has changed; a strike on a row that no longer agrees is taken off.
 */
export async function keepFindings(
  scope: Scope,
  statement: StoredStatement,
  company: CompanySettings,
): Promise<Kept> {
  const { facts, result, rows, upToDate } = await workOut(scope, statement, company);
  if (upToDate) return { changed: false, reopened: [], rows };
  const wanted = matchValues(result.matchResult);
  if (!sameMatches(facts.storedMatches, wanted)) {
    await replaceEngineMatches(scope, statement.id, wanted);
  }
  const stored = await variancesOf(scope, statement.id);
  for (const change of varianceChanges(statement, result, stored)) {
    if (change.do === 'add') await insertVariance(scope, change.values);
    else await updateVariance(scope, change.id, change.values);
  }
  const settled = new Set(rows.filter((row) => row.settled).map((row) => row.key));
  const strikes = await strikesOf(scope, statement.id);
  const reopened = strikes.map(({ rowKey }) => rowKey).filter((key) => !settled.has(key));
  await deleteStrikes(scope, statement.id, reopened);
  return { changed: true, reopened, rows };
}
