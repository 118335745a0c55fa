import { sendMail } from './send-mail';
import type { Handler, WorkKind } from './work-item';

/** Who does which work. Items of a kind that is not listed stay waiting. */
export const HANDLERS: Partial<Record<WorkKind, Handler>> = {
  sendMail,
};
