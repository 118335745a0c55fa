import { acceptRowsInput, settledRows } from '../../contracts/sheet';
import { defineVerb } from '../verb';
import { settleRows } from './settle';

export const acceptRows = defineVerb({
  name: 'statements.accept',
  says: 'Accept rows as billed, with a reason',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/statements/{statementId}/accept' },
  input: acceptRowsInput,
  output: settledRows,
  run: (ctx, { statementId, rowKeys, reason }) =>
    settleRows(ctx, { statementId, rowKeys, state: 'accepted', reason }, () => null),
});
