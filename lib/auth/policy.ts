/** The three kinds of people in a company. */
export type Role = 'owner' | 'bookkeeper' | 'foreman';

const everyone = ['owner', 'bookkeeper', 'foreman'] as const;
const office = ['owner', 'bookkeeper'] as const;
const owner = ['owner'] as const;

/**
 * Who may do what: the one table that pages, routes and screens consult. A verb names its
 * permission, so nothing is allowed that is not listed here.
 */
export const POLICY = {
  'self.use': { says: 'see and change one’s own account', roles: everyone },
  'jobs.read': { says: 'see jobs and placements (a foreman: his own)', roles: everyone },
  'jobs.write': { says: 'add and change jobs, placements and crews', roles: office },
  'orders.read': { says: 'see orders', roles: everyone },
  'orders.write': { says: 'draft, send, confirm, change and cancel orders', roles: everyone },
  'tickets.read': { says: 'see tickets and their photos', roles: everyone },
  'tickets.write': { says: 'photograph, check and correct tickets', roles: everyone },
  'suppliers.read': { says: 'see suppliers', roles: office },
  'suppliers.write': { says: 'add and change suppliers', roles: office },
  'rates.read': { says: 'see rate sheets', roles: office },
  'rates.write': { says: 'draft rate sheets', roles: office },
  'rates.approve': { says: 'approve a rate sheet', roles: owner },
  'statements.read': { says: 'see statements and the strike-off sheet', roles: office },
  'statements.write': { says: 'import, match, strike off and mark', roles: office },
  'statements.close': { says: 'close a statement whose lines are all settled', roles: office },
  'statements.reopen': { says: 'reopen a closed statement', roles: owner },
  'variances.read': { says: 'see variances', roles: office },
  'yield.read': { says: 'see yield across jobs', roles: office },
  'company.read': { says: 'see the company’s settings and people', roles: owner },
  'company.write': { says: 'change the company’s settings', roles: owner },
  'people.manage': { says: 'invite people, change roles, remove', roles: owner },
  'keys.manage': { says: 'issue and revoke access keys', roles: owner },
  'outbox.read': { says: 'read the mail that was written', roles: owner },
  'activity.read': { says: 'read the activity record', roles: owner },
} as const satisfies Record<string, { says: string; roles: readonly Role[] }>;

export type Permission = keyof typeof POLICY;

export function roleMay(role: Role, permission: Permission): boolean {
  return (POLICY[permission].roles as readonly Role[]).includes(role);
}
