import { settledRows, strikeInput } from '../../contracts/sheet';
import { failure } from '../failure';
import { defineVerb } from '../verb';
import { rowInWords } from './internal';
import { settleRows } from './settle';

export const strikeRows = defineVerb({
  name: 'statements.strike',
  says: 'Strike off rows of a sheet that agree, exactly or within tolerance',
  kind: 'write',
  permission: 'statements.write',
  http: { method: 'POST', path: '/api/statements/{statementId}/strike' },
  input: strikeInput,
  output: settledRows,
  run: (ctx, { statementId, rowKeys }) =>
    settleRows(ctx, { statementId, rowKeys, state: 'struck', reason: '' }, (rows) => {
      const open = rows.find((row) => row.verdict === 'finding' || row.verdict === 'notChecked');
      if (!open) return null;
      const why =
        open.verdict === 'finding'
          ? 'does not agree: accept it with a reason or ask for a credit'
          : 'has no rate sheet to be held against: accept it with a reason';
      const words = rowInWords(open);
      return failure('conflict', `${words[0]?.toUpperCase()}${words.slice(1)} ${why}.`);
    }),
});
