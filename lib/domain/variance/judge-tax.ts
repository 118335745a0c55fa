import type { BillLineFacts, OrderFacts } from '../facts';
import { sameJob } from '../matching/delivery';
import {
  extend,
  type Money,
  money,
  quantity,
  roundCents,
  sumMoney,
  ZERO_MONEY,
} from '../money/money';
import type { ClauseKind, TAXABLE_KINDS } from '../rating/clauses';
import { taxFraction } from '../rating/clauses-by-kind/tax';
import type { OrderIndex } from '../rating/order-index';
import type { TaxClause } from '../rating/sheet-index';
import { dollars, figure } from '../words';
import { type Judgement, notCheckable, subtract, withinSlack } from './draft';
import type { LineCase } from './line-case';
import type { Taken } from './take';

type TaxableKind = (typeof TAXABLE_KINDS)[number];

/** A charge line as tax looks at it. */
interface Charge {
  readonly line: BillLineFacts;
  readonly tax: TaxClause | null;
  readonly taxable: boolean;
  readonly exempt: boolean;
}

/** The charges that one tax line (or several together) is for. */
export interface TaxScope {
  readonly name: string;
  readonly taxLines: readonly BillLineFacts[];
  readonly charges: readonly Charge[];
}

const CLAUSE_OF: Readonly<Record<BillLineFacts['chargeKind'], TaxableKind | null>> = {
  mix: 'mixPrice',
  shortLoad: 'shortLoad',
  waiting: 'waiting',
  perLoadFee: 'perLoadFee',
  perYardFee: 'perYardFee',
  pumpTime: 'pumpTime',
  pumpMinimum: 'pumpTime',
  pumpYards: 'pumpYards',
  pumpSetUp: 'pumpSetUp',
  other: 'perLoadFee',
  tax: null,
};

function clauseKindOf(at: LineCase, taken: Taken | undefined): ClauseKind | null {
  const fee = taken?.expected[0]?.chargeKind;
  if (fee === 'perLoadFee' || fee === 'perYardFee') return fee;
  return CLAUSE_OF[at.line.chargeKind];
}

function toCharge(
  at: LineCase,
  taken: Taken | undefined,
  orders: readonly OrderFacts[],
  index: OrderIndex,
): Charge {
  const { line } = at;
  const tax = at.sheet?.tax ?? null;
  const kind = clauseKindOf(at, taken);
  const [delivery] = [...at.tickets, ...at.pumpTickets];
  const exempt = delivery
    ? index.isExempt(delivery)
    : orders.some((order) => !order.taxable && sameJob(line.jobName, order.jobName));
  const isCredit = line.chargeKind === 'other' && line.amount.isNegative();
  const listed = (tax?.clause.taxes as readonly ClauseKind[] | undefined) ?? [];
  return { line, tax, exempt, taxable: kind !== null && listed.includes(kind) && !isCredit };
}

const invoiceKey = ({ supplierId, invoiceNumber }: BillLineFacts) =>
  JSON.stringify([supplierId, invoiceNumber]);

/**
 * Which charges each tax line is for: those of its ticket where it prints a ticket's number, else
 * those of its invoice, else all that no other tax line is for. A tax line whose invoice has no
 * charges of its own is taken as the whole bill's.
 */
export function taxScopes(
  taxLines: readonly BillLineFacts[],
  cases: readonly LineCase[],
  taken: ReadonlyMap<string, Taken>,
  orders: readonly OrderFacts[],
  index: OrderIndex,
): TaxScope[] {
  const charges = cases.map((at) => toCharge(at, taken.get(at.line.id), orders, index));
  const scopes = new Map<string, { name: string; taxLines: BillLineFacts[]; charges: Charge[] }>();
  const invoices = new Set(charges.map(({ line }) => invoiceKey(line)));
  const ticketKey = (line: BillLineFacts) =>
    JSON.stringify([line.supplierId, 't', line.ticketNumber]);
  const ticketed = new Set(charges.map(({ line }) => ticketKey(line)));
  for (const line of taxLines) {
    const ofTicket = line.ticketNumber !== null && ticketed.has(ticketKey(line));
    const ofInvoice = line.invoiceNumber !== null && invoices.has(invoiceKey(line));
    const key = ofTicket ? ticketKey(line) : ofInvoice ? invoiceKey(line) : 'rest';
    const name = ofTicket
      ? `ticket ${line.ticketNumber}`
      : ofInvoice
        ? `invoice ${line.invoiceNumber}`
        : 'this bill';
    const scope = scopes.get(key) ?? { name, taxLines: [], charges: [] };
    scope.taxLines.push(line);
    scopes.set(key, scope);
  }
  for (const charge of charges) {
    const keys = [ticketKey(charge.line), invoiceKey(charge.line), 'rest'];
    const key = keys.find((one) => scopes.has(one)) ?? invoiceKey(charge.line);
    const { invoiceNumber } = charge.line;
    const name = invoiceNumber === null ? 'this bill' : `invoice ${invoiceNumber}`;
    const scope = scopes.get(key) ?? { name, taxLines: [], charges: [] };
    scope.charges.push(charge);
    scopes.set(key, scope);
  }
  return [...scopes.values()];
}

const total = (charges: readonly Charge[]) => sumMoney(charges.map(({ line }) => line.amount));

interface Owed {
  readonly amount: Money;
  readonly base: Money;
  /** The one rate of the scope; null where its charges have several or none. */
  readonly tax: TaxClause | null;
  readonly words: string;
}

/** The tax on the billed charges of a scope, rounded once per rate. */
export function taxOwed({ charges }: TaxScope): Owed {
  const due = charges.filter(({ taxable, exempt }) => taxable && !exempt);
  const byRate = new Map<string, { tax: TaxClause; charges: Charge[] }>();
  for (const charge of charges) {
    if (!charge.tax) continue;
    const group = byRate.get(charge.tax.clause.ratePercent) ?? { tax: charge.tax, charges: [] };
    if (due.includes(charge)) group.charges.push(charge);
    byRate.set(charge.tax.clause.ratePercent, group);
  }
  const parts = [...byRate.values()].map((group) => {
    const base = total(group.charges);
    const amount = roundCents(extend(quantity(base), taxFraction(group.tax.clause)));
    const rate = figure(money(group.tax.clause.ratePercent));
    return { base, amount, words: `${dollars(base)} × ${rate}% = ${dollars(amount)}` };
  });
  const [only, second] = byRate.values();
  return {
    amount: sumMoney(parts.map((part) => part.amount)),
    base: sumMoney(parts.map((part) => part.base)),
    tax: only && !second ? only.tax : null,
    words: parts.map((part) => part.words).join('; '),
  };
}

/** The likeliest cause of a wrong tax: exempt or untaxed charges in the base, or another rate. */
function diagnosis(scope: TaxScope, owed: Owed, billed: Money): string {
  const { base, tax } = owed;
  if (tax) {
    const exempt = total(scope.charges.filter((one) => one.taxable && one.exempt));
    const untaxed = total(scope.charges.filter((one) => !one.taxable && !one.exempt));
    const fraction = taxFraction(tax.clause);
    const on = (more: Money) => roundCents(extend(quantity(base.plus(more)), fraction));
    if (!exempt.isZero() && withinSlack(on(exempt), billed)) {
      return `Tax is charged on ${dollars(exempt)} for an exempt place of delivery`;
    }
    if (!untaxed.isZero() && withinSlack(on(untaxed), billed)) {
      return `Tax is charged on ${dollars(untaxed)} of charges that are not taxable`;
    }
    if (!exempt.isZero() && withinSlack(on(money(exempt.plus(untaxed))), billed)) {
      return `Tax is charged on ${dollars(exempt)} that is exempt and ${dollars(untaxed)} that is not taxable`;
    }
  }
  if (base.isZero()) return 'Tax is charged where nothing is taxable';
  const implied = figure(money(billed.dividedBy(base).times(100).toDecimalPlaces(2)));
  return `${dollars(billed)} is ${implied}% of the ${dollars(base)} that is taxable`;
}

/**
 * The tax lines of a scope, held against the tax on its *billed* taxable charges: wrong yards or
 * an unowed fee is that line's finding and does not come back here. Several lines for one scope
 * (state and county) are compared together; all but the last count as billed.
 */
export function judgeTax(scope: TaxScope): Map<string, Judgement> {
  const judged = new Map<string, Judgement>();
  const { taxLines, name } = scope;
  const owed = taxOwed(scope);
  if (!scope.charges.some(({ tax }) => tax !== null)) {
    for (const line of taxLines) {
      judged.set(line.id, notCheckable(`No rate sheet says what tax is due on ${name}.`));
    }
    return judged;
  }
  const billed = sumMoney(taxLines.map((line) => line.amount));
  const why = `Tax on ${name}: ${owed.words}.`;
  const steps = [
    { label: 'Taxable as billed', value: dollars(owed.base) },
    { label: 'Tax', value: owed.words },
    { label: 'Billed', value: dollars(billed) },
  ];
  const agrees = withinSlack(owed.amount, billed);
  taxLines.forEach((line, at) => {
    if (at < taxLines.length - 1) {
      const sentence = `${why} Together with the other tax lines.`;
      judged.set(line.id, { expectedAmount: line.amount, findings: [], sentence, steps });
      return;
    }
    const others = sumMoney(taxLines.slice(0, -1).map((one) => one.amount));
    const expected = subtract(owed.amount, others);
    const sentence = `${why} The bill says ${dollars(billed)}: ${diagnosis(scope, owed, billed)}.`;
    const clauseId = owed.tax?.id ?? null;
    const finding = {
      kind: 'taxWrong',
      expected,
      billed: line.amount,
      clauseId,
      sentence,
      steps,
    } as const;
    const findings = agrees ? [] : [finding];
    judged.set(line.id, { expectedAmount: expected, findings, sentence: why, steps });
  });
  return judged;
}

/**
 * Tax that a bill leaves out for one of its invoices although it taxes others. A bill without any
 * tax line does not itemise tax, and nothing is said about it.
 */
export function untaxedScopes(scopes: readonly TaxScope[]): TaxScope[] {
  if (scopes.every(({ taxLines }) => taxLines.length === 0)) return [];
  return scopes.filter(
    (scope) => scope.taxLines.length === 0 && !withinSlack(taxOwed(scope).amount, ZERO_MONEY),
  );
}
