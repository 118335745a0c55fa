/** Why a verb did not do what it was asked: a closed set of codes, each mapped once to HTTP. */
export const FAILURE_STATUS = {
  notSignedIn: 401,
  notAllowed: 403,
  foreignOrigin: 403,
  notFound: 404,
  conflict: 409,
  invalid: 422,
  tooLarge: 413,
  wrongType: 415,
  tooMany: 429,
  closed: 409,
} as const;
export type FailureCode = keyof typeof FAILURE_STATUS;

export interface Issue {
  /** The field, "lines.0.quantity", or the place in a file. */
  readonly path: string;
  readonly message: string;
}

export interface Failure {
  readonly code: FailureCode;
  readonly message: string;
  readonly issues: readonly Issue[];
}

export function failure(
  code: FailureCode,
  message: string,
  issues: readonly Issue[] = [],
): Failure {
  return { code, message, issues };
}

/** A missing record and another company's record are the same to whoever asks. */
export function notFound(what: string): Failure {
  return failure('notFound', `There is no such ${what}, or it was removed.`);
}
