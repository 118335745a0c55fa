import Link from 'next/link';
import { CopyTag } from '@/components/ui/copy-tag';
import { Section } from '@/components/ui/section';
import type { TicketDetail } from '@/lib/contracts/tickets';
import { routes } from '@/lib/routes';
import { tickets as words } from '@/lib/text/messages/en/tickets';

/** Where the ticket is billed, with the way to the strike-off sheet. */
export function BilledLines({ billed }: { billed: TicketDetail['billed'] }) {
  return (
    <Section title={words.billedTitle} action={<CopyTag copy="billed" />}>
      {billed.length === 0 ? (
        <p className="text-ink-soft">{words.notBilled}</p>
      ) : (
        <ul>
          {billed.map((line) => (
            <li
              key={`${line.statementId} ${line.position}`}
              className="border-b border-cured py-2 last:border-b-0"
            >
              <Link href={routes.statement(line.statementId)}>
                {words.billedOn(line.statementNumber)}
              </Link>{' '}
              <span className="text-ink-soft">
                {words.billedLine(line.position, line.invoiceNumber)}
                {line.closed && ` · ${words.closed}`}
              </span>
            </li>
          ))}
        </ul>
      )}
    </Section>
  );
}
