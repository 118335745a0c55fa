'use client';

import { Section } from '@/components/ui/section';
import { Moment } from '@/components/ui/where';
import type { TicketDetail } from '@/lib/contracts/tickets';
import { pourDay } from '@/lib/text/messages/en/pour-day';
import { tickets as words } from '@/lib/text/messages/en/tickets';
import { shownValue } from './shown-value';

const FIELD_NAMES: Readonly<Record<string, string>> = {
  ...pourDay.fields,
  supplier: words.supplier,
  job: words.job,
  placement: words.columns.placement,
  order: words.order,
  status: words.status,
};

/** Who did what to the ticket, with what it was before. */
export function TicketActivity({ events }: { events: TicketDetail['activity'] }) {
  return (
    <Section title={words.activityTitle} className="pb-10">
      <ol>
        {events.map((event) => (
          <li key={event.id} className="border-b border-cured py-2 text-[14.5px]">
            <p>{event.summary}</p>
            <p className="text-[13px] text-ink-soft">
              {event.actorName} · <Moment at={event.at} />
            </p>
            {event.changes.length > 0 && <Changes changes={event.changes} />}
          </li>
        ))}
      </ol>
    </Section>
  );
}

function Changes({ changes }: { changes: TicketDetail['activity'][number]['changes'] }) {
  return (
    <details>
      <summary className="inline-block py-1 text-[13px] text-carbon">
        {words.changes(changes.length)}
      </summary>
      <table className="mb-1 w-full max-w-2xl border-collapse text-[13.5px] [&_td]:border-t [&_td]:border-cured [&_td]:py-1 [&_td]:pr-4 [&_th]:py-1 [&_th]:pr-4 [&_th]:text-left [&_th]:text-xs [&_th]:font-semibold [&_th]:text-ink-soft">
        <thead>
          <tr>
            <th scope="col">{words.field}</th>
            <th scope="col">{words.before}</th>
            <th scope="col">{words.after}</th>
          </tr>
        </thead>
        <tbody>
          {changes.map((change) => (
            <tr key={change.field}>
              <td>{FIELD_NAMES[change.field] ?? change.field}</td>
              <td>{shownValue(change.field, change.before) ?? words.nothing}</td>
              <td>{shownValue(change.field, change.after) ?? words.nothing}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </details>
  );
}
