import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Store } from '../../db/client';
import { matches, statements, strikes, variances } from '../../db/schema/statements';
import { tickets } from '../../db/schema/tickets';
import { acceptRows } from '../../lib/services/statements/accept-rows';
import { claimRows } from '../../lib/services/statements/claim-rows';
import { closeStatement } from '../../lib/services/statements/close-statement';
import { getSheet } from '../../lib/services/statements/get-sheet';
import { listStatements } from '../../lib/services/statements/list-statements';
import { matchByHand } from '../../lib/services/statements/match-by-hand';
import { matchCandidates } from '../../lib/services/statements/match-candidates';
import { refreshFindings } from '../../lib/services/statements/refresh-findings';
import { reopenStatement } from '../../lib/services/statements/reopen-statement';
import { strikeRows } from '../../lib/services/statements/strike-rows';
import { undoLast } from '../../lib/services/statements/undo';
import { unmatchLine } from '../../lib/services/statements/unmatch-line';
import { unstrikeRows } from '../../lib/services/statements/unstrike-rows';
import { listVariances } from '../../lib/services/variances/list-variances';
import { callVerb } from '../../lib/services/verb';
import { asVerb, BILL, billWorld, rowOf, rowsOf, takenIn, value } from '../support/bill-world';
import { temporaryFolder, testStore } from '../support/store';

const folder = temporaryFolder();
let store: Store;

beforeAll(async () => {
  process.env.DATA_DIR = folder.path;
  store = await testStore();
});
afterAll(async () => {
  await store.close();
  folder.remove();
});

const world = () => billWorld(store);

describe('the strike-off sheet', () => {
  it('shows each line with its delivery, what was expected, and what differs', async () => {
    const w = await world();
    const { rows } = await takenIn(w);
    expect(rowOf(rows, '7001')).toMatchObject({
      verdict: 'agrees',
      expected: '1500.00',
      difference: '0.00',
      match: { method: 'number' },
    });
    expect(rowOf(rows, '7002')).toMatchObject({
      verdict: 'finding',
      expected: '1200.00',
      difference: '75.00',
      findings: [{ kind: 'yardsDiffer' }],
    });
  });

  it('strikes off what agrees, refuses what does not, and keeps who and when', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    const agreeing = rowOf(rows, '7001').key;
    const differing = rowOf(rows, '7002').key;
    const refused = await callVerb(strikeRows, w.bookkeeper, {
      statementId,
      rowKeys: [agreeing, differing],
    });
    expect(refused).toMatchObject({ ok: false, error: { code: 'conflict' } });
    expect(rowOf(await rowsOf(w, statementId), '7001').settled).toBeNull();
    const struck = await callVerb(strikeRows, w.bookkeeper, { statementId, rowKeys: [agreeing] });
    expect(struck).toMatchObject({
      ok: true,
      value: { rows: [{ key: agreeing, settled: { state: 'struck', by: 'Test bookkeeper' } }] },
    });
    // A double press, and a second person on the same row.
    await value(asVerb(strikeRows), w.owner, { statementId, rowKeys: [agreeing] });
    expect(rowOf(await rowsOf(w, statementId), '7001').settled?.by).toBe('Test bookkeeper');
    const kept = await store.handle
      .select()
      .from(strikes)
      .where(and(eq(strikes.companyId, w.companyId), eq(strikes.statementId, statementId)));
    expect(kept).toHaveLength(1);
  });

  it('accepts with a reason and claims a finding; both can be taken back', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    const rowKeys = [rowOf(rows, '7002').key];
    const bare = await callVerb(acceptRows, w.bookkeeper, { statementId, rowKeys, reason: ' ' });
    expect(bare).toMatchObject({ ok: false, error: { code: 'invalid' } });
    await value(asVerb(claimRows), w.bookkeeper, { statementId, rowKeys });
    const claimed = await callVerb(listVariances, w.bookkeeper, { status: 'claimed' });
    expect(claimed).toMatchObject({
      ok: true,
      value: { total: 1, totals: { against: '75.00', inOurFavour: '0.00' } },
    });
    await value(asVerb(unstrikeRows), w.bookkeeper, { statementId, rowKeys });
    await value(asVerb(acceptRows), w.bookkeeper, { statementId, rowKeys, reason: 'ours' });
    const accepted = await callVerb(listVariances, w.bookkeeper, { status: 'accepted' });
    expect(accepted.ok && accepted.value.rows[0]).toMatchObject({
      reason: 'ours',
      difference: '75.00',
      decidedBy: 'Test bookkeeper',
    });
    const agreeing = await callVerb(claimRows, w.bookkeeper, {
      statementId,
      rowKeys: [rowOf(rows, '7001').key],
    });
    expect(agreeing).toMatchObject({ ok: false, error: { code: 'conflict' } });
  });

  it('takes back one’s own last step only, step by step', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    const [one, two, three] = ['7001', '7002', '7003'].map((ticket) => rowOf(rows, ticket).key);
    await value(asVerb(strikeRows), w.bookkeeper, { statementId, rowKeys: [one] });
    await value(asVerb(claimRows), w.bookkeeper, { statementId, rowKeys: [two] });
    await value(asVerb(strikeRows), w.owner, { statementId, rowKeys: [three] });
    const settled = async () =>
      (await rowsOf(w, statementId)).filter((row) => row.settled).map((row) => row.key);
    await value(asVerb(undoLast), w.bookkeeper, { statementId });
    expect(await settled()).toEqual([one, three]);
    await value(asVerb(undoLast), w.bookkeeper, { statementId });
    expect(await settled()).toEqual([three]);
    expect(await value(asVerb(undoLast), w.bookkeeper, { statementId })).toMatchObject({
      undone: null,
    });
    const open = await callVerb(listVariances, w.bookkeeper, { status: 'open' });
    expect(open).toMatchObject({ ok: true, value: { total: 1 } });
  });

  it('follows the facts: a corrected ticket opens what no longer agrees', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    await value(asVerb(strikeRows), w.bookkeeper, {
      statementId,
      rowKeys: [rowOf(rows, '7001').key],
    });
    await store.handle
      .update(tickets)
      .set({ quantityYd3: '9.00' })
      .where(eq(tickets.id, w.ticketIds.get('7001') ?? ''));
    const sheet = await callVerb(getSheet, w.bookkeeper, { statementId });
    expect(sheet).toMatchObject({ ok: true, value: { upToDate: false } });
    expect(sheet.ok && rowOf(sheet.value.rows, '7001')).toMatchObject({
      settled: null,
      difference: '150.00',
    });
    expect(await value(asVerb(refreshFindings), w.bookkeeper, {})).toEqual({ changed: true });
    expect(await value(asVerb(refreshFindings), w.bookkeeper, {})).toEqual({ changed: false });
    const open = await callVerb(listVariances, w.bookkeeper, { status: 'open' });
    expect(open).toMatchObject({ ok: true, value: { total: 2, totals: { against: '225.00' } } });
  });

  it('keeps a person’s match over the engine’s, until it is left to the engine again', async () => {
    const w = await world();
    const text = BILL.replace('7001,', '9999,');
    const { statementId, rows } = await takenIn(w, text);
    const line = rowOf(rows, '9999');
    const billLineId = line.billed?.lineId ?? '';
    const found = await callVerb(matchCandidates, w.bookkeeper, { statementId, billLineId });
    expect(found.ok && found.value.rows.map((row) => row.number)).toContain('7003');
    await value(asVerb(unmatchLine), w.bookkeeper, {
      statementId,
      billLineId,
      leaveTo: 'nothing',
    });
    expect(rowOf(await rowsOf(w, statementId), '9999')).toMatchObject({
      deliveries: [],
      findings: [{ kind: 'billedNotDelivered' }],
    });
    const ticketId = w.ticketIds.get('7001') ?? '';
    await value(asVerb(matchByHand), w.bookkeeper, {
      statementId,
      billLineId,
      deliveries: [{ kind: 'ticket', id: ticketId }],
    });
    const matched = rowOf(await rowsOf(w, statementId), '9999');
    expect(matched).toMatchObject({ verdict: 'agrees', match: { method: 'hand' } });
    await value(asVerb(undoLast), w.bookkeeper, { statementId });
    const ties = await store.handle
      .select()
      .from(matches)
      .where(and(eq(matches.companyId, w.companyId), eq(matches.billLineId, billLineId)));
    expect(ties.every((tie) => tie.method !== 'hand')).toBe(true);
    const stranger = await world();
    expect(
      await callVerb(matchByHand, w.bookkeeper, {
        statementId,
        billLineId,
        deliveries: [{ kind: 'ticket', id: stranger.ticketIds.get('7001') ?? '' }],
      }),
    ).toMatchObject({ ok: false, error: { code: 'notFound' } });
  });

  it('closes only when every row is settled, then stays as it was', async () => {
    const w = await world();
    const { statementId, rows } = await takenIn(w);
    const early = await callVerb(closeStatement, w.bookkeeper, { statementId });
    expect(early).toMatchObject({ ok: false, error: { code: 'conflict' } });
    const keys = (ticket: string) => [rowOf(rows, ticket).key];
    await value(asVerb(strikeRows), w.bookkeeper, {
      statementId,
      rowKeys: [...keys('7001'), ...keys('7003')],
    });
    await value(asVerb(claimRows), w.bookkeeper, { statementId, rowKeys: keys('7002') });
    await value(asVerb(closeStatement), w.bookkeeper, { statementId });
    await store.handle
      .update(tickets)
      .set({ quantityYd3: '1.00' })
      .where(eq(tickets.id, w.ticketIds.get('7001') ?? ''));
    expect(rowOf(await rowsOf(w, statementId), '7001')).toMatchObject({
      verdict: 'agrees',
      settled: { state: 'struck' },
    });
    for (const [verb, input] of [
      [strikeRows, { rowKeys: keys('7001') }],
      [undoLast, {}],
      [closeStatement, {}],
    ] as const) {
      expect(await callVerb(asVerb(verb), w.bookkeeper, { statementId, ...input })).toMatchObject({
        ok: false,
        error: { code: 'closed' },
      });
    }
    const mayNot = { statementId, reason: 'found a ticket' };
    expect(await callVerb(reopenStatement, w.bookkeeper, mayNot)).toMatchObject({
      ok: false,
      error: { code: 'notAllowed' },
    });
    await value(asVerb(reopenStatement), w.owner, mayNot);
    expect(rowOf(await rowsOf(w, statementId), '7001').settled).toBeNull();
    const list = await callVerb(listStatements, w.bookkeeper, { status: 'open' });
    expect(list).toMatchObject({ ok: true, value: { rows: [{ lines: 3, settled: 2 }] } });
  });

  it('is not for foremen, nor for another company', async () => {
    const [w, other] = [await world(), await world()];
    const { statementId } = await takenIn(w);
    expect(await callVerb(getSheet, w.foreman, { statementId })).toMatchObject({
      ok: false,
      error: { code: 'notAllowed' },
    });
    expect(await callVerb(getSheet, other.owner, { statementId })).toMatchObject({
      ok: false,
      error: { code: 'notFound' },
    });
    const theirs = await store.handle
      .select()
      .from(variances)
      .where(eq(variances.companyId, other.companyId));
    expect(theirs).toEqual([]);
    const kept = await store.handle
      .select()
      .from(statements)
      .where(eq(statements.companyId, w.companyId));
    expect(kept).toHaveLength(1);
  });
});
