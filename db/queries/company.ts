import { eq } from 'drizzle-orm';
import type { CompanySettingsRow } from '../../lib/contracts/company';
import { companies } from '../schema/companies';
import type { Scope } from '../tx';

export async function findCompany(scope: Scope): Promise<CompanySettingsRow | null> {
  const [row] = await scope.handle
    .select({
      id: companies.id,
      name: companies.name,
      timeZone: companies.timeZone,
      clock: companies.clock,
      foremenSeePrices: companies.foremenSeePrices,
      foremenSeeAllJobs: companies.foremenSeeAllJobs,
      tolerances: companies.tolerances,
      isDemo: companies.isDemo,
    })
    .from(companies)
    .where(eq(companies.id, scope.companyId));
  return row ?? null;
}

export async function updateCompany(
  scope: Scope,
  values: Omit<CompanySettingsRow, 'id' | 'isDemo'>,
): Promise<void> {
  await scope.handle.update(companies).set(values).where(eq(companies.id, scope.companyId));
}
