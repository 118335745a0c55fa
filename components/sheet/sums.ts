import type { SheetRow } from '@/lib/contracts/sheet';
import { type Money, money, moneyText, sumMoney } from '@/lib/domain/money/money';

/** A sheet in figures, as its head and its band show them. Amounts are decimal text. */
export interface SheetSums {
  readonly rows: number;
  readonly settled: number;
  readonly billed: string;
  readonly expected: string;
  /** Of what is settled without a finding. */
  readonly agrees: string;
  /** Findings of rows that are not settled. */
  readonly openFindings: number;
  readonly openAgainst: string;
  readonly openFavour: string;
  /** Rows that can be struck off as they are. */
  readonly strikeable: readonly string[];
}

export function canBeStruck(row: SheetRow): boolean {
  return row.settled === null && (row.verdict === 'agrees' || row.verdict === 'withinTolerance');
}

const isAccount = (row: SheetRow) => row.kind === 'credit' || row.kind === 'payment';

export function sumsOf(rows: readonly SheetRow[]): SheetSums {
  const held = rows.filter((row) => !isAccount(row));
  const billed = sumMoney(held.flatMap((row) => (row.billed ? [money(row.billed.amount)] : [])));
  const difference = sumMoney(held.map((row) => money(row.difference)));
  const open = rows
    .filter((row) => row.settled === null)
    .flatMap((row) => row.findings.filter((finding) => !finding.withinTolerance));
  const openSum = (wanted: (amount: Money) => boolean) =>
    moneyText(sumMoney(open.map((one) => money(one.difference)).filter(wanted)));
  return {
    rows: rows.length,
    settled: rows.filter((row) => row.settled !== null).length,
    billed: moneyText(billed),
    expected: moneyText(money(billed.minus(difference))),
    agrees: moneyText(
      sumMoney(
        held.flatMap((row) =>
          row.billed && row.verdict !== 'finding' && row.verdict !== 'notChecked'
            ? [money(row.billed.amount)]
            : [],
        ),
      ),
    ),
    openFindings: open.length,
    openAgainst: openSum((amount) => amount.isPositive()),
    openFavour: openSum((amount) => amount.isNegative()),
    strikeable: rows.filter(canBeStruck).map((row) => row.key),
  };
}

export const SHEET_VIEWS = ['all', 'open', 'findings', 'settled'] as const;
export type SheetView = (typeof SHEET_VIEWS)[number];

function inView(row: SheetRow, view: SheetView): boolean {
  switch (view) {
    case 'all':
      return true;
    case 'open':
      return row.settled === null;
    case 'findings':
      return row.findings.length > 0 || row.verdict === 'notChecked';
    case 'settled':
      return row.settled !== null;
  }
}

function says(row: SheetRow, search: string): boolean {
  const text = [
    row.ordered?.jobName,
    row.ordered?.orderNumber,
    row.billed?.description,
    row.billed?.ticketNumber,
    row.billed?.jobName,
    row.billed?.invoiceNumber,
    ...row.deliveries.flatMap((one) => [one.number, one.truck]),
    ...row.findings.map((finding) => finding.sentence),
  ]
    .join(' ')
    .toLowerCase();
  return search
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word));
}

/** The rows that a view and a search leave. */
export function rowsShown(rows: readonly SheetRow[], view: SheetView, search: string): SheetRow[] {
  return rows.filter(
    (row) => inView(row, view) && (search.trim() === '' || says(row, search.trim())),
  );
}
