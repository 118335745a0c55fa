import { readFileSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { reconcile } from '../domain/variance/reconcile';
import { type InputFile, readInput } from './reconcile-input';
import { outputJson } from './reconcile-output';
import { problemText } from './reconcile-tables';

/**
 * The engine without the web:
 *
 *   npm run --silent reconcile -- --rates R.json --tickets T.csv --bill B.csv
 *                                 [--orders O.csv] [--pump P.csv]
 *
 * R.json: { "rateSheets": [{ "supplier", "job"?, "name", "version"?, "effectiveFrom",
 * "effectiveTo"?, "clauses": [...] }] }, clauses as in lib/domain/rating/clauses.ts.
 * CSV files have a header row; columns in any order, * is required, `supplier` is too where the
 * rates are of several. Days are YYYY-MM-DD, times HH:MM (24-hour), numbers plain.
 *   T: supplier, number*, date*, mixCode*, quantityYd3*, returnedYd3, truck, plant, job, order,
 *      load, batchedAt, arrivedAt, startedAt, finishedAt, leftAt
 *   B: supplier, invoice, date, ticket, truck, job, charge*, description, mixCode, quantity,
 *      unit, unitPrice, amount*   (charge is one of CHARGE_KINDS in lib/domain/facts.ts)
 *   O: supplier, number*, date*, orderedYd3*, mixCode, job, firstTruckAt, spacingMinutes,
 *      taxable (yes or no; yes when empty)
 *   P: supplier, number*, date*, pumpedYd3*, setUps, job, order, leftYardAt, arrivedAt,
 *      finishedAt, leftAt, backInYardAt
 *
 * Prints JSON (matches, variances, expected, totals) and ends with 0, whatever the variances;
 * anything wrong with the input goes to stderr, a sentence per place, and ends with 1.
 */

const USAGE =
  'Usage: npm run --silent reconcile -- --rates R.json --tickets T.csv --bill B.csv [--orders O.csv] [--pump P.csv]';

function fail(sentences: readonly string[]): never {
  for (const sentence of sentences) console.error(sentence);
  process.exit(1);
}

function readArguments() {
  const text = { type: 'string' } as const;
  try {
    return parseArgs({
      options: { rates: text, tickets: text, bill: text, orders: text, pump: text },
      allowPositionals: false,
    }).values;
  } catch (error) {
    return fail([error instanceof Error ? error.message : String(error), USAGE]);
  }
}

function readFile(name: string): InputFile {
  try {
    return { name, text: readFileSync(name, 'utf8') };
  } catch {
    return fail([`${name}: cannot be read. Is the path right?`]);
  }
}

const { rates, tickets, bill, orders, pump } = readArguments();
if (!rates || !tickets || !bill) fail(['--rates, --tickets and --bill must be given.', USAGE]);
const input = readInput({
  rates: readFile(rates),
  tickets: readFile(tickets),
  bill: readFile(bill),
  orders: orders ? readFile(orders) : null,
  pump: pump ? readFile(pump) : null,
});
if (!input.ok) fail(input.problems.map(problemText));
const result = reconcile({
  ...input.facts,
  earlierLines: [],
  handMatches: [],
  tolerances: {},
  statement: null,
});
console.log(JSON.stringify(outputJson(result), null, 2));
