import { createTicketReader } from '../../importers/ocr/read-ticket';
import { log } from '../log';
import { readPhotoHandler } from './read-photo';
import { sendMail } from './send-mail';
import type { Handler, WorkKind } from './work-item';

/** One engine for the one worker; it starts with the first photo. */
const reader = createTicketReader({
  onEngineError: (error) => log.error({ err: error }, 'the ticket reader reported a fault'),
});

/** Who does which work. Items of a kind that is not listed stay waiting. */
export const HANDLERS: Partial<Record<WorkKind, Handler>> = {
  readPhoto: readPhotoHandler(reader.read),
  sendMail,
};
