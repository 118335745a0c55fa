import type { Role } from '@/lib/auth/policy';
import { routes } from '@/lib/routes';

const HOMES: Record<Role, () => string> = {
  foreman: () => routes.pourDay(),
  bookkeeper: () => routes.statements(),
  owner: () => routes.yield(),
};

/** Where a person's day starts. */
export function homeOf(role: Role): string {
  return HOMES[role]();
}
