import { listMail } from '../../../db/queries/outbox';
import { listOutboxInput, listOutboxOutput } from '../../contracts/outbox';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listOutbox = defineVerb({
  name: 'outbox.list',
  says: 'List the messages that were written, newest first',
  kind: 'read',
  permission: 'outbox.read',
  http: { method: 'GET', path: '/api/outbox' },
  input: listOutboxInput,
  output: listOutboxOutput,
  async run({ scope }, { offset, limit, state, search }) {
    return ok(await listMail(scope, { state, search }, { offset, limit }));
  },
});
