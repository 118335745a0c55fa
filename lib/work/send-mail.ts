import { and, eq } from 'drizzle-orm';
import { Resend } from 'resend';
import type { Store } from '../../db/client';
import { outbox } from '../../db/schema/activity';
import type { Clock } from '../clock';
import { readEnv } from '../env';
import type { WorkItem } from './work-item';
import { GiveUp } from './work-item';

const SERVICE_TIMEOUT_MS = 30_000;

/**
 * Sends a message of the outbox through the mail service; without a key it stays in the outbox,
 * where the owner reads it. The outbox id is the idempotency key, so a repeat after a crash does
 * not reach the addressee twice.
 */
export async function sendMail(item: WorkItem, { handle }: Store, clock: Clock): Promise<void> {
  const { resendApiKey, resendBaseUrl, mailFrom } = readEnv();
  if (!resendApiKey) return;
  const mine = and(eq(outbox.companyId, item.companyId), eq(outbox.id, item.subjectId));
  const [mail] = await handle.select().from(outbox).where(mine);
  if (!mail) throw new GiveUp('The message is missing.');
  if (mail.sentAt) return;
  const service = new Resend(resendApiKey, resendBaseUrl ? { baseUrl: resendBaseUrl } : {});
  const { data, error } = await service.emails.send(
    { from: mailFrom, to: mail.to, subject: mail.subject, text: mail.text },
    { idempotencyKey: mail.id, signal: AbortSignal.timeout(SERVICE_TIMEOUT_MS) },
  );
  if (error || !data) {
    const reason = error?.message ?? 'The mail service did not answer.';
    await handle.update(outbox).set({ error: reason }).where(mine);
    throw isPermanent(error?.statusCode) ? new GiveUp(reason) : new Error(reason);
  }
  await handle
    .update(outbox)
    .set({
      sentAt: clock.now(),
      providerId: data.id,
      error: null,
      text: withoutSecrets(mail.kind, mail.text),
    })
    .where(mine);
}

/** What trying again can't mend: the service refused the message, and is not just busy. */
function isPermanent(status: number | null | undefined): boolean {
  return (
    typeof status === 'number' && status >= 400 && status < 500 && ![408, 409, 429].includes(status)
  );
}

/** Once sent, a link that opens an account is the addressee's alone; the owner's copy loses it. */
function withoutSecrets(kind: string, text: string): string {
  if (kind === 'order') return text;
  return text.replace(/https?:\/\/\S+/g, '(the link was taken out when the message was sent)');
}
