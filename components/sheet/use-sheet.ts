'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useCallback, useState } from 'react';
import type { z } from 'zod';
import type { Candidate, SettledState, Sheet, SheetRow } from '@/lib/contracts/sheet';
import { matchOutput, settledRows, undoOutput } from '@/lib/contracts/sheet';
import { ApiFailure, apiSend } from '@/lib/queries/api';
import { sheetQuery } from '@/lib/queries/statements';
import { sheetWords as words } from '@/lib/text/messages/en/statements';
import { failureText } from '@/lib/text/problems';
import { useLocale } from '../ui/locale';

const VERBS: Record<SettledState, string> = {
  struck: 'strike',
  accepted: 'accept',
  claimed: 'claim',
};

function withSettled(
  sheet: Sheet | undefined,
  keys: ReadonlySet<string>,
  settled: SheetRow['settled'],
): Sheet | undefined {
  if (!sheet) return sheet;
  return {
    ...sheet,
    rows: sheet.rows.map((row) => (keys.has(row.key) ? { ...row, settled } : row)),
  };
}

/**
 * A sheet and what can be done on it. Settling shows at once and is taken back when the server
 * says no; what it said stays in `problem` until the next step.
 */
export function useSheet(first: Sheet, me: string) {
  const statementId = first.statement.id;
  const locale = useLocale();
  const queries = useQueryClient();
  const key = sheetQuery(statementId).queryKey;
  const { data } = useQuery({ ...sheetQuery(statementId), initialData: first });
  const [problem, setProblem] = useState<string | null>(null);
  const [said, setSaid] = useState<string | null>(null);
  const [pending, setPending] = useState(0);

  const reload = useCallback(
    () => queries.invalidateQueries({ queryKey: ['statements'] }),
    [queries],
  );

  const attempt = useCallback(
    async (work: () => Promise<void>): Promise<boolean> => {
      setProblem(null);
      setSaid(null);
      setPending((count) => count + 1);
      try {
        await work();
        return true;
      } catch (error) {
        if (!(error instanceof ApiFailure)) throw error;
        setProblem(failureText(locale, error));
        await reload();
        return false;
      } finally {
        setPending((count) => count - 1);
      }
    },
    [locale, reload],
  );

  const post = useCallback(
    <Output extends z.ZodType>(verb: string, body: unknown, output: Output) =>
      apiSend('POST', `/api/statements/${statementId}/${verb}`, body, output),
    [statementId],
  );

  const settle = useCallback(
    (state: SettledState, rowKeys: readonly string[], more: Record<string, string> = {}) =>
      attempt(async () => {
        if (rowKeys.length === 0) return;
        await queries.cancelQueries({ queryKey: key });
        const settled = { state, reason: more.reason ?? '', by: me, at: new Date().toISOString() };
        queries.setQueryData<Sheet>(key, (sheet) => withSettled(sheet, new Set(rowKeys), settled));
        const answer = await post(VERBS[state], { rowKeys, ...more }, settledRows);
        for (const row of answer.rows) {
          queries.setQueryData<Sheet>(key, (sheet) =>
            withSettled(sheet, new Set([row.key]), row.settled),
          );
        }
      }),
    [attempt, key, me, post, queries],
  );

  const unsettle = useCallback(
    (rowKeys: readonly string[]) =>
      attempt(async () => {
        await post('unstrike', { rowKeys }, settledRows);
        await reload();
      }),
    [attempt, post, reload],
  );

  const undo = useCallback(
    () =>
      attempt(async () => {
        const { undone, rows } = await post('undo', {}, undoOutput);
        await reload();
        setSaid(
          undone === null
            ? words.undone.none
            : undone === 'settled'
              ? words.undone.settled(rows.length)
              : words.undone.matched,
        );
      }),
    [attempt, post, reload],
  );

  const matchTo = useCallback(
    (billLineId: string, deliveries: readonly Pick<Candidate, 'kind' | 'id'>[]) =>
      attempt(async () => {
        await post('match', { billLineId, deliveries }, matchOutput);
        await reload();
      }),
    [attempt, post, reload],
  );

  const unmatch = useCallback(
    (billLineId: string, leaveTo: 'nothing' | 'engine') =>
      attempt(async () => {
        await post('unmatch', { billLineId, leaveTo }, matchOutput);
        await reload();
      }),
    [attempt, post, reload],
  );

  return {
    sheet: data,
    problem,
    said,
    say: setSaid,
    pending: pending > 0,
    settle,
    unsettle,
    undo,
    matchTo,
    unmatch,
    reload,
  };
}

export type SheetActions = ReturnType<typeof useSheet>;
