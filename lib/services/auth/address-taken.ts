/** Whether the database refused a second live account with one address. */
export function isAddressTaken(error: unknown): boolean {
  for (let cause = error; cause instanceof Error; cause = cause.cause) {
    const { code, constraint } = cause as { code?: unknown; constraint?: unknown };
    if (code === '23505' && constraint === 'people_email') return true;
  }
  return false;
}
