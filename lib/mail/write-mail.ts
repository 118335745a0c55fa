import { outbox, workItems } from '../../db/schema/activity';
import type { Scope } from '../../db/tx';
import type { Clock } from '../clock';
import { newId } from '../ids';
import type { MailText } from './templates';

/**
 * Puts a message into the outbox and has the worker send it, both in the caller's transaction:
 * what is rolled back is never sent, and what is committed always is. Returns the outbox id.
 */
export async function writeMail(
  ctx: { readonly scope: Scope; readonly clock: Clock },
  message: MailText & { readonly to: string },
): Promise<string> {
  const id = newId<'mail'>();
  const { companyId, handle } = ctx.scope;
  await handle.insert(outbox).values({
    id,
    companyId,
    kind: message.kind,
    to: message.to,
    subject: oneLine(message.subject),
    text: message.text,
    createdAt: ctx.clock.now(),
  });
  await handle.insert(workItems).values({
    id: newId(),
    companyId,
    kind: 'sendMail',
    subjectId: id,
    runAfter: ctx.clock.now(),
  });
  return id;
}

/** Names reach the subject; a line break in one must not begin a header. */
function oneLine(text: string): string {
  return text.replace(/[\p{Cc}\u2028\u2029]+/gu, ' ').trim();
}
