import type { z } from 'zod';
import { jobChoices, supplierChoices } from '../../../db/queries/yield';
import { dayIn } from '../../clock';
import {
  type listYieldInput as Filter,
  listYieldInput,
  listYieldOutput,
  type YieldAnswer,
  type YieldJob,
} from '../../contracts/yield';
import { quantity } from '../../domain/money/money';
import { ok } from '../../domain/result';
import type { Ctx } from '../context';
import { defineVerb } from '../verb';
import { yieldFigures } from './figures';
import { type PlacedFacts, placedFacts } from './work-out';

/** A pour that is still running, or has no delivery, says nothing about yield yet. */
function isOver({ placement, facts }: PlacedFacts, today: string): boolean {
  const over = placement.status === 'poured' || placement.pourDate < today;
  return over && facts.tickets.length > 0;
}

function jobRow(poured: readonly PlacedFacts[]): YieldJob | null {
  const [first] = poured;
  if (!first) return null;
  const { jobId, jobNumber, jobName } = first.placement;
  return {
    jobId,
    jobNumber,
    jobName,
    ...yieldFigures(poured),
    placements: poured.map((one) => ({
      placementId: one.placement.id,
      name: one.placement.name,
      pourDate: one.placement.pourDate,
      ...yieldFigures([one]),
    })),
  };
}

/** Nothing known sorts last whichever way. */
function byFigure(read: (row: YieldJob) => string | null, sign: 1 | -1) {
  return (one: YieldJob, other: YieldJob) => {
    const [left, right] = [read(one), read(other)];
    if (left === null || right === null) return Number(left === null) - Number(right === null);
    return sign * quantity(left).comparedTo(quantity(right));
  };
}

function sorted(rows: readonly YieldJob[], { sort, direction }: z.output<typeof Filter>) {
  const sign = direction === 'up' ? 1 : -1;
  const byNumber = (one: YieldJob, other: YieldJob) =>
    one.jobNumber.localeCompare(other.jobNumber) || one.jobId.localeCompare(other.jobId);
  const by = {
    overrun: byFigure((row) => row.overrunShare, sign),
    cost: byFigure((row) => row.costPerYd3, sign),
    delivered: byFigure((row) => row.deliveredYd3, sign),
    waiting: byFigure((row) => row.minutesPerYd3, sign),
    job: (one: YieldJob, other: YieldJob) => sign * byNumber(one, other),
  }[sort];
  return [...rows].sort((one, other) => by(one, other) || byNumber(one, other));
}

export async function workOutYield(
  { scope, clock, company }: Pick<Ctx, 'scope' | 'clock' | 'company'>,
  filter: z.output<typeof Filter>,
): Promise<YieldAnswer> {
  const today = dayIn(company.timeZone, clock.now());
  const placed = (await placedFacts(scope, filter)).filter((one) => isOver(one, today));
  const byJob = new Map<string, PlacedFacts[]>();
  for (const one of placed) {
    const group = byJob.get(one.placement.jobId) ?? [];
    group.push(one);
    byJob.set(one.placement.jobId, group);
  }
  return {
    rows: sorted(
      [...byJob.values()].flatMap((group) => jobRow(group) ?? []),
      filter,
    ),
    totals: yieldFigures(placed),
    jobs: await jobChoices(scope),
    suppliers: await supplierChoices(scope),
  };
}

export const listYield = defineVerb({
  name: 'yield.list',
  says: 'Yards figured, ordered, delivered and billed by job and placement, with overrun and cost',
  kind: 'read',
  permission: 'yield.read',
  http: { method: 'GET', path: '/api/yield' },
  input: listYieldInput,
  output: listYieldOutput,
  async run(ctx, filter) {
    return ok(await workOutYield(ctx, filter));
  },
});
