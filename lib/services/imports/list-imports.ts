import { pendingImports } from '../../../db/queries/imports';
import { listImportsInput, listImportsOutput } from '../../contracts/imports';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listImports = defineVerb({
  name: 'imports.list',
  says: 'List uploaded files that wait for their preview to be accepted',
  kind: 'read',
  permission: 'statements.read',
  http: { method: 'GET', path: '/api/imports' },
  input: listImportsInput,
  output: listImportsOutput,
  async run({ scope }) {
    return ok({ rows: await pendingImports(scope) });
  },
});
