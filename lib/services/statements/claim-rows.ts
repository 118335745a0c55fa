import { claimRowsInput, settledRows } from '../../contracts/sheet';
import { failure } from '../failure';
import { defineVerb } from '../verb';
import { rowInWords } from './internal';
import { settleRows } from './settle';

export const claimRows = defineVerb({
  name: 'statements.claim',
  says: 'Mark rows with findings for a credit request',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/statements/{statementId}/claim' },
  input: claimRowsInput,
  output: settledRows,
  run: (ctx, { statementId, rowKeys, note }) =>
    settleRows(ctx, { statementId, rowKeys, state: 'claimed', reason: note }, (rows) => {
      const agreeing = rows.find((row) => row.verdict !== 'finding');
      if (!agreeing) return null;
      return failure(
        'conflict',
        `There is nothing to ask a credit for on ${rowInWords(agreeing)}: it has no finding.`,
      );
    }),
});
