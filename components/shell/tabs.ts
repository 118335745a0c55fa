import type { Permission, Role } from '@/lib/auth/policy';
import { roleMay } from '@/lib/auth/policy';
import { routes } from '@/lib/routes';
import type { CommonMessages } from '@/lib/text/messages/en/common';

export interface Tab {
  readonly name: keyof CommonMessages['tabs'];
  readonly href: string;
  /** Addresses that belong to the tab, besides those below its own. */
  readonly also: readonly string[];
  readonly permission: Permission;
}

const TABS: readonly Tab[] = [
  { name: 'jobs', href: routes.jobs(), also: ['/placements'], permission: 'jobs.read' },
  { name: 'orders', href: routes.orders(), also: [], permission: 'orders.read' },
  { name: 'tickets', href: routes.tickets(), also: [], permission: 'tickets.read' },
  {
    name: 'suppliers',
    href: routes.suppliers(),
    also: ['/rate-sheets'],
    permission: 'suppliers.read',
  },
  { name: 'statements', href: routes.statements(), also: [], permission: 'statements.read' },
  { name: 'variances', href: routes.variances(), also: [], permission: 'variances.read' },
  { name: 'yield', href: routes.yield(), also: [], permission: 'yield.read' },
  { name: 'company', href: routes.company(), also: [], permission: 'company.read' },
];

const POUR_DAY: Tab = {
  name: 'pourDay',
  href: routes.pourDay(),
  also: [],
  permission: 'tickets.write',
};

/** The index tabs that a role may open; a foreman's start with pour day. */
export function tabsFor(role: Role): Tab[] {
  const all = role === 'foreman' ? [POUR_DAY, ...TABS] : TABS;
  return all.filter((tab) => roleMay(role, tab.permission));
}

/** Whether an address belongs to a tab. */
export function isUnder(tab: Tab, pathname: string): boolean {
  return [tab.href, ...tab.also].some(
    (start) => pathname === start || pathname.startsWith(`${start}/`),
  );
}
