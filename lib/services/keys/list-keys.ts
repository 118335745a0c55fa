import * as keyQueries from '../../../db/queries/keys';
import { listKeysInput, listKeysOutput } from '../../contracts/keys';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listKeys = defineVerb({
  name: 'keys.list',
  says: 'List the access keys, revoked ones included',
  kind: 'read',
  permission: 'keys.manage',
  http: { method: 'GET', path: '/api/keys' },
  input: listKeysInput,
  output: listKeysOutput,
  async run({ scope }) {
    return ok({ rows: await keyQueries.listKeys(scope) });
  },
});
