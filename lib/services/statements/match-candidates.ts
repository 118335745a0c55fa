import type { StoredBillLine } from '../../../db/queries/sheet-facts';
import { matchesOf } from '../../../db/queries/sheet-state';
import { findStatement } from '../../../db/queries/statements';
import {
  type Candidate,
  candidatesInput,
  candidatesOutput,
  type SheetDelivery,
} from '../../contracts/sheet';
import { foldedNumber, plainNumber } from '../../domain/matching/numbers';
import { quantity } from '../../domain/money/money';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';
import { deliveriesNear, lineOf } from './line-window';
import { pumpDelivery, ticketDelivery } from './sheet-rows';

/** What speaks for a delivery being the line's, the strongest first. */
function reasonsFor(line: StoredBillLine, delivery: SheetDelivery): Candidate['reasons'] {
  const reasons: Candidate['reasons'] = [];
  const printed = line.ticketNumber ?? '';
  if (printed !== '') {
    if (plainNumber(printed) === plainNumber(delivery.number)) reasons.push('sameNumber');
    else {
      const folded = foldedNumber(printed);
      if (folded !== null && folded === foldedNumber(delivery.number)) reasons.push('likeNumber');
    }
  }
  if (line.quantity !== null && quantity(line.quantity).eq(quantity(delivery.quantityYd3))) {
    reasons.push('sameYards');
  }
  if (line.date === delivery.date) reasons.push('sameDay');
  if (line.truck !== null && line.truck !== '' && line.truck === delivery.truck) {
    reasons.push('sameTruck');
  }
  return reasons;
}

function matchesSearch(candidate: Candidate, search: string): boolean {
  if (search === '') return true;
  const wanted = search.toLowerCase();
  return [candidate.number, candidate.jobName, candidate.truck ?? '', candidate.date].some((text) =>
    text.toLowerCase().includes(wanted),
  );
}

const WEIGHT = { sameNumber: 16, likeNumber: 8, sameYards: 4, sameDay: 2, sameTruck: 1 } as const;
const weightOf = ({ tied, reasons }: Candidate) =>
  (tied ? 100 : 0) + reasons.reduce((sum, reason) => sum + WEIGHT[reason], 0);

const MOST_SHOWN = 200;

export const matchCandidates = defineVerb({
  name: 'statements.candidates',
  says: 'List the deliveries that a billed line could be for, the likeliest first',
  kind: 'read',
  permission: 'statements.read',
  http: { method: 'GET', path: '/api/statements/{statementId}/lines/{billLineId}/candidates' },
  input: candidatesInput,
  output: candidatesOutput,
  async run({ scope }, { statementId, billLineId, search }) {
    const statement = await findStatement(scope, statementId);
    if (!statement) return fail(notFound('statement'));
    const line = await lineOf(scope, statementId, billLineId);
    if (!line) return fail(notFound('line'));
    const near = await deliveriesNear(scope, statement, line);
    const ties = await matchesOf(scope, statementId);
    const tiesOf = (id: string) =>
      ties.filter((match) => match.ticketId === id || match.pumpTicketId === id);
    const rows = [
      ...near.tickets.map((one) => ({ delivery: ticketDelivery(one), jobName: one.jobName })),
      ...near.pumpTickets.map((one) => ({ delivery: pumpDelivery(one), jobName: one.jobName })),
    ]
      .map(({ delivery, jobName }): Candidate => {
        const own = tiesOf(delivery.id);
        return {
          ...delivery,
          jobName: jobName ?? '',
          tiedLines: new Set(own.map((match) => match.billLineId)).size,
          tied: own.some((match) => match.billLineId === billLineId),
          reasons: reasonsFor(line, delivery),
        };
      })
      .filter((candidate) => matchesSearch(candidate, search))
      .sort(
        (one, other) =>
          weightOf(other) - weightOf(one) ||
          other.date.localeCompare(one.date) ||
          one.number.localeCompare(other.number),
      );
    return ok({ rows: rows.slice(0, MOST_SHOWN) });
  },
});
