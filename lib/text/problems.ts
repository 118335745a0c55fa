import type { Locale } from './locale';
import { problems } from './messages/es/problems';

/** A failure's sentence in a language; the server's own where we have no translation. */
export function failureText(locale: Locale, failure: { code: string; message: string }): string {
  if (locale === 'en') return failure.message;
  return problems.failures[failure.code] ?? failure.message;
}

/** What is wrong with a field, in a language. */
export function issueText(locale: Locale, message: string): string {
  if (locale === 'en') return message;
  return problems.issues[message] ?? message;
}
