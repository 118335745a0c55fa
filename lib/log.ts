import pino from 'pino';
import { readEnv } from './env';

/** Structured log to standard output; secrets never enter it. */
export const log = pino({
  level: readEnv().logLevel,
  redact: ['password', 'token', '*.password', '*.token', 'headers.cookie', 'headers.authorization'],
});
