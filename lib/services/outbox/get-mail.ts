import { findMail } from '../../../db/queries/outbox';
import { getMailInput, mailMessage } from '../../contracts/outbox';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

export const getMail = defineVerb({
  name: 'outbox.get',
  says: 'Read one message',
  kind: 'read',
  permission: 'outbox.read',
  http: { method: 'GET', path: '/api/outbox/{mailId}' },
  input: getMailInput,
  output: mailMessage,
  async run({ scope }, { mailId }) {
    const mail = await findMail(scope, mailId);
    return mail ? ok(mail) : fail(notFound('message'));
  },
});
