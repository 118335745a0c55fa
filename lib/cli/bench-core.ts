import { performance } from 'node:perf_hooks';
import type { BillLineFacts, TicketFacts } from '../domain/facts';
import { matchBill } from '../domain/matching/match-bill';
import { money, quantity } from '../domain/money/money';
import { clauseSchema, type RateSheetFacts } from '../domain/rating/clauses';
import { expectedBill } from '../domain/rating/expected-bill';

/**
 * How fast the core is: loads rated, and lines matched, per second at growing sizes. Prints, and
 * asserts nothing. `npm run bench -- rating|matching`.
 */

const SIZES = [1_000, 10_000, 100_000];
const LOADS_A_DAY = 100;
const DAY_MS = 86_400_000;
const FIRST_DAY = Date.UTC(2020, 0, 1);

const CLAUSES = [
  { kind: 'mixPrice', mixCode: '4000A', dollarsPerYd3: '158' },
  { kind: 'mixPrice', mixCode: null, dollarsPerYd3: '165' },
  {
    kind: 'shortLoad',
    thresholdYd3: '6',
    charge: { basis: 'perShortYd3', dollarsPerYd3: '40' },
  },
  {
    kind: 'waiting',
    free: { basis: 'perYd3', minutesPerYd3: '3' },
    dollarsPerMinute: '2.25',
  },
  { kind: 'perLoadFee', name: 'Environmental fee', dollars: '18' },
  { kind: 'tax', ratePercent: '7.25', taxes: ['mixPrice'] },
].map((clause, at) => ({ id: `c${at}`, clause: clauseSchema.parse(clause) }));

const SHEET: RateSheetFacts = {
  id: 'sheet',
  supplierId: 'supplier',
  jobId: null,
  name: 'Bench',
  version: 1,
  effectiveFrom: '2020-01-01',
  effectiveTo: null,
  clauses: CLAUSES,
};

function loads(size: number): TicketFacts[] {
  return Array.from({ length: size }, (_, at) => {
    const arrivedAt = 420 + ((at * 7) % 480);
    return {
      id: `t${at}`,
      number: String(400_000 + at),
      supplierId: 'supplier',
      orderId: null,
      jobId: null,
      jobName: null,
      date: new Date(FIRST_DAY + Math.floor(at / LOADS_A_DAY) * DAY_MS).toISOString().slice(0, 10),
      plant: null,
      truck: String(200 + (at % 37)),
      loadNumber: null,
      mixCode: at % 3 === 0 ? '4500' : '4000A',
      quantityYd3: quantity(String(4 + ((at * 5) % 14) / 2)),
      returnedYd3: null,
      batchedAt: null,
      arrivedAt,
      startedAt: null,
      finishedAt: arrivedAt + 15 + (at % 40),
      leftAt: null,
    };
  });
}

function billFor(tickets: readonly TicketFacts[], withNumbers: boolean): BillLineFacts[] {
  return tickets.map((ticket, at) => ({
    id: `l${at}`,
    supplierId: ticket.supplierId,
    position: at + 1,
    invoiceNumber: null,
    date: ticket.date,
    ticketNumber: withNumbers ? (at % 10 === 0 ? `0${ticket.number}` : ticket.number) : null,
    jobName: null,
    truck: ticket.truck,
    chargeKind: 'mix',
    description: '',
    mixCode: ticket.mixCode,
    quantity: ticket.quantityYd3,
    unit: 'YD',
    unitPrice: money('158'),
    amount: money('1580'),
  }));
}

function report(what: string, size: number, work: () => string): void {
  const start = performance.now();
  const result = work();
  const seconds = (performance.now() - start) / 1000;
  const rate = Math.round(size / seconds).toLocaleString('en-US');
  console.log(
    `${what} ${size.toLocaleString('en-US')}: ${seconds.toFixed(2)} s, ${rate} a second (${result})`,
  );
}

/** Rates `SIZES` loads by a sheet of six clauses. */
function benchRating(): void {
  for (const size of SIZES) {
    const tickets = loads(size);
    report('loads rated', size, () => {
      const input = { rateSheets: [SHEET], orders: [], tickets, pumpTickets: [] };
      return `${expectedBill(input).lines.length} lines`;
    });
  }
}

/** Matches as many lines as loads, by number, then with no number at all: by fit alone. */
function benchMatching(): void {
  for (const withNumbers of [true, false]) {
    const what = withNumbers ? 'lines matched by number' : 'lines matched by fit';
    for (const size of SIZES) {
      const tickets = loads(size);
      const lines = billFor(tickets, withNumbers);
      report(what, size, () => {
        const input = { lines, tickets, pumpTickets: [], handMatches: [] };
        return `${matchBill(input).matches.length} matched`;
      });
    }
  }
}

const BENCHES: Readonly<Record<string, () => void>> = {
  rating: benchRating,
  matching: benchMatching,
};

/** Runs one of the benches by name; false where there is none of that name. */
export function runBench(name: string): boolean {
  const bench = BENCHES[name];
  bench?.();
  return bench !== undefined;
}
