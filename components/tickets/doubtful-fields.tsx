'use client';

import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { Button } from '../ui/button';
import { classNames } from '../ui/class-names';
import { useLocale } from '../ui/locale';
import type { FieldChoices } from './ticket-field';
import { TicketField } from './ticket-field';
import type { TicketFormField } from './ticket-form-schema';
import type { TicketCheck } from './use-ticket-form';

interface DoubtfulFieldsProps {
  check: TicketCheck;
  choices: FieldChoices;
  look: TicketFormField | null;
  onLook: (field: TicketFormField | null) => void;
  /** Confirming was tried: say which are still open. */
  insists: boolean;
}

/** The fields that the reader was not sure of, each one press from being settled. */
export function DoubtfulFields(props: DoubtfulFieldsProps) {
  const { check, choices, look, onLook, insists } = props;
  const words = pourDayMessages(useLocale());
  if (check.doubtful.length === 0) return null;
  return (
    <section className="border-b border-wet bg-canary px-4 pt-3 pb-4">
      <h2 className="text-lg">{words.check.lookAtThese}</h2>
      <p className="text-[14px]">{words.check.lookSays}</p>
      <ul className="mt-2 grid gap-3">
        {check.doubtful.map((field) => (
          <li
            key={field}
            id={`look-at-${field}`}
            className={classNames(
              'scroll-mt-[46dvh] grid grid-cols-[1fr_auto] items-end gap-2 border-l-[5px] pl-2.5',
              check.open.includes(field) ? 'border-keel' : 'border-moss',
              insists && check.open.includes(field) && look === field && 'bg-canary-soft',
            )}
          >
            <TicketField
              field={field}
              state={check.state}
              choices={choices}
              onLook={onLook}
              hint={
                <DoubtfulHint
                  open={check.open.includes(field)}
                  found={field in (check.reading?.suggestion?.values ?? {})}
                />
              }
            />
            {check.open.includes(field) && (
              <Button
                variant="quiet"
                className="mb-6 min-h-14"
                aria-label={words.check.isRight(words.fields[field])}
                disabled={check.state.form.watch(field) === ''}
                onClick={() => {
                  check.markRight(field);
                  onLook(check.open.find((one) => one !== field) ?? null);
                }}
              >
                {words.check.right}
              </Button>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}

function DoubtfulHint({ open, found }: { open: boolean; found: boolean }) {
  const words = pourDayMessages(useLocale()).check;
  if (!open) return <span className="font-semibold text-moss">{words.rightDone}</span>;
  return <span className="font-semibold text-keel">{found ? words.doubtful : words.missing}</span>;
}
