/** A full load after a session began or ended, so that no screen of another person stays behind. */
export function goTo({ next }: { next: string }): void {
  window.location.assign(next);
}
