'use client';

import { isBeingRead } from '@/lib/queries/tickets';
import { pourDayMessages } from '@/lib/text/messages/pour-day';
import { useLocale } from '../ui/locale';
import { Notice } from '../ui/notice';
import { SnapButtons } from './snap-buttons';
import type { TicketCheck } from './use-ticket-form';

interface ReadingStateProps {
  check: TicketCheck;
  hasPhoto: boolean;
  onAnother: ((file: File) => void) | null;
}

/** How far the reading is, why it failed, and what else is to be said about the photo. */
export function ReadingState({ check, hasPhoto, onAnother }: ReadingStateProps) {
  const locale = useLocale();
  const words = pourDayMessages(locale);
  const { reading } = check;
  if (!hasPhoto || !reading) return null;
  if (isBeingRead(reading.state)) {
    return (
      <p role="status" className="relative overflow-hidden bg-canary-soft px-4 py-3">
        <span className="font-semibold">{words.reading}</span> {words.check.readingSays}
        <span aria-hidden className="busy-rule absolute inset-x-0 bottom-0 h-1" />
      </p>
    );
  }
  if (reading.state === 'failed') {
    const why = locale === 'en' ? reading.failureSentence : null;
    return (
      <div className="px-4 pt-3">
        <Notice tone="warning" title={words.check.readFailed}>
          {why} {words.check.typeInstead}
        </Notice>
        {onAnother && (
          <SnapButtons
            size="normal"
            className="mt-2 [&_button]:min-h-14"
            snap={words.check.anotherPhoto}
            choose={words.choosePhoto}
            onFile={onAnother}
          />
        )}
      </div>
    );
  }
  if (locale !== 'en' || reading.notes.length === 0) return null;
  return (
    <Notice tone="warning" className="mx-4 mt-3">
      {reading.notes.map((note) => (
        <p key={note.code}>{note.sentence}</p>
      ))}
    </Notice>
  );
}
