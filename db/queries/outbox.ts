import { and, count, desc, eq, ilike, or, type SQL, sql } from 'drizzle-orm';
import type { MailMessage, MailRow } from '../../lib/contracts/outbox';
import { outbox, workItems } from '../schema/activity';
import type { Scope } from '../tx';
import { containing } from './jobs';

/** Where a message stands, from its own row and its work item's. */
const state = sql<MailRow['state']>`case
  when ${outbox.sentAt} is not null then 'sent'
  when ${workItems.state} = 'failed' then 'failed'
  when ${workItems.state} = 'done' then 'kept'
  else 'waiting' end`;

const columns = {
  id: outbox.id,
  kind: sql<MailRow['kind']>`${outbox.kind}`,
  to: outbox.to,
  subject: outbox.subject,
  text: outbox.text,
  writtenAt: outbox.createdAt,
  sentAt: outbox.sentAt,
  state,
  error: outbox.error,
};

function selectMail(scope: Scope, where: SQL | undefined) {
  return scope.handle
    .select(columns)
    .from(outbox)
    .leftJoin(
      workItems,
      and(
        eq(workItems.companyId, outbox.companyId),
        eq(workItems.kind, 'sendMail'),
        eq(workItems.subjectId, outbox.id),
      ),
    )
    .where(and(eq(outbox.companyId, scope.companyId), where));
}

type Selected = Awaited<ReturnType<typeof selectMail>>[number];

function toMessage(row: Selected): MailMessage {
  return {
    ...row,
    writtenAt: row.writtenAt.toISOString(),
    sentAt: row.sentAt?.toISOString() ?? null,
  };
}

export async function listMail(
  scope: Scope,
  filter: { readonly state: MailRow['state'] | 'all'; readonly search: string },
  page: { readonly offset: number; readonly limit: number },
): Promise<{ rows: MailRow[]; total: number }> {
  const where = and(
    filter.state === 'all' ? undefined : eq(state, filter.state),
    filter.search
      ? or(
          ilike(outbox.to, containing(filter.search)),
          ilike(outbox.subject, containing(filter.search)),
        )
      : undefined,
  );
  const counted = scope.handle
    .select({ total: count() })
    .from(selectMail(scope, where).as('matching'));
  const [{ total } = { total: 0 }] = await counted;
  const rows = await selectMail(scope, where)
    .orderBy(desc(outbox.createdAt), desc(outbox.id))
    .limit(page.limit)
    .offset(page.offset);
  return {
    total,
    rows: rows.map((row) => {
      const { text: _text, ...listed } = toMessage(row);
      return listed;
    }),
  };
}

export async function findMail(scope: Scope, mailId: string): Promise<MailMessage | null> {
  const [row] = await selectMail(scope, eq(outbox.id, mailId));
  return row ? toMessage(row) : null;
}
