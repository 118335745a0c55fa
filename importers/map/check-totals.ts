import { type Money, money, moneyText, sumMoney, ZERO_MONEY } from '@/lib/domain/money/money';
import type { DiagnosticCollector } from '../core/diagnostic';
import type { DocumentFacts, ImportItem, ImportTotals } from '../core/plan';

type Sums = Pick<ImportTotals, 'charges' | 'tax' | 'credits' | 'payments' | 'net'>;

function isBilled(item: ImportItem): boolean {
  return item.action === 'create' || item.skipReason === 'alreadyImported';
}

function amountOf(item: ImportItem): Money {
  return item.values.amount === null ? ZERO_MONEY : money(item.values.amount);
}

/** Sums of the whole file, lines already imported included. */
export function sumItems(items: readonly ImportItem[]): Sums {
  const billed = items.filter(isBilled);
  const sum = (kind: ImportItem['rowKind']) =>
    moneyText(sumMoney(billed.filter((item) => item.rowKind === kind).map(amountOf)));
  return {
    charges: sum('line'),
    tax: sum('tax'),
    credits: sum('credit'),
    payments: sum('payment'),
    net: moneyText(sumMoney(billed.map(amountOf))),
  };
}

/** Balances that stand in rows overrule those of the preamble. */
export function withBalances(facts: DocumentFacts, items: readonly ImportItem[]): DocumentFacts {
  const opening = items.find((item) => item.rowKind === 'opening')?.values.amount;
  const closing = items.findLast((item) => item.rowKind === 'closing')?.values.amount;
  return {
    ...facts,
    openingBalance: opening ?? facts.openingBalance,
    closingBalance: closing ?? facts.closingBalance,
  };
}

/** Running sums by row kind. */
class Running {
  private readonly byKind = new Map<string, Money>();

  add(item: ImportItem): void {
    const before = this.byKind.get(item.rowKind) ?? ZERO_MONEY;
    this.byKind.set(item.rowKind, before.plus(amountOf(item)) as Money);
  }

  of(...kinds: readonly string[]): Money {
    return sumMoney(kinds.map((kind) => this.byKind.get(kind) ?? ZERO_MONEY));
  }

  /** What a printed total may mean: with or without tax, credits and payments. */
  possible(): Money[] {
    return [
      this.of('line', 'tax', 'credit', 'payment'),
      this.of('line', 'tax', 'credit'),
      this.of('line', 'tax'),
      this.of('line', 'credit'),
      this.of('line'),
      this.of('tax'),
      this.of('payment'),
      this.of('credit', 'payment'),
    ];
  }
}

/** Compares printed totals with the lines above them: those since the last total, or all. */
function checkSubtotals(
  items: readonly ImportItem[],
  opening: string | null,
  collector: DiagnosticCollector,
): void {
  const all = new Running();
  let group = new Running();
  for (const item of items) {
    if (isBilled(item)) {
      all.add(item);
      group.add(item);
    }
    if (item.rowKind !== 'subtotal' || item.values.amount === null) continue;
    const printed = money(item.values.amount);
    const net = all.of('line', 'tax', 'credit', 'payment');
    const rolled = opening === null ? [] : [net.plus(opening) as Money];
    const possible = [...group.possible(), ...all.possible(), ...rolled];
    group = new Running();
    if (possible.some((sum) => sum.abs().eq(printed.abs()))) continue;
    observeTotal(item, printed, closestTo(possible, printed), collector);
  }
}

function closestTo(possible: readonly Money[], printed: Money): Money {
  return possible.reduce((best, sum) =>
    sum.minus(printed).abs().lt(best.minus(printed).abs()) ? sum : best,
  );
}

function observeTotal(
  item: ImportItem,
  printed: Money,
  closest: Money,
  collector: DiagnosticCollector,
): void {
  collector.add({
    code: 'totals.differ',
    severity: 'warning',
    line: item.sourceLine,
    raw: item.raw,
    expected: moneyText(closest),
    got: moneyText(printed),
    sentence: `Line ${item.sourceLine} prints a total of ${moneyText(printed)}; the lines come to ${moneyText(closest)}.`,
    hint: 'Look for a line that failed above, or ask the supplier.',
  });
}

/** Opening + charges + tax − credits − payments must be the closing balance. */
function checkRoll(facts: DocumentFacts, net: string, collector: DiagnosticCollector): void {
  if (facts.openingBalance === null || facts.closingBalance === null) return;
  const expected = money(facts.openingBalance).plus(net);
  const closing = money(facts.closingBalance);
  if (expected.eq(closing)) return;
  collector.add({
    code: 'statement.doesNotRoll',
    severity: 'warning',
    expected: moneyText(expected),
    got: moneyText(closing),
    sentence: `Opening ${moneyText(money(facts.openingBalance))} and lines of ${net} come to ${moneyText(expected)}; the statement closes at ${moneyText(closing)}.`,
    hint: 'Look for a line that failed, or ask the supplier for the missing lines.',
  });
}

export function checkTotals(
  items: readonly ImportItem[],
  facts: DocumentFacts,
  net: string,
  collector: DiagnosticCollector,
): void {
  checkSubtotals(items, facts.openingBalance, collector);
  checkRoll(facts, net, collector);
}
