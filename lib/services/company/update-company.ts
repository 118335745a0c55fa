import { findCompany, updateCompany as storeCompany } from '../../../db/queries/company';
import { companySettings, updateCompanyInput } from '../../contracts/company';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

export const updateCompany = defineVerb({
  name: 'company.update',
  says: 'Change the company’s settings',
  kind: 'write',
  permission: 'company.write',
  http: { method: 'PUT', path: '/api/company' },
  input: updateCompanyInput,
  output: companySettings,
  async run(ctx, values) {
    const before = await findCompany(ctx.scope);
    await storeCompany(ctx.scope, values);
    const after = await findCompany(ctx.scope);
    if (!before || !after) return fail(notFound('company'));
    await ctx.record({
      action: 'company.update',
      entity: 'company',
      entityId: after.id,
      summary: 'Changed the company’s settings',
      before,
      after,
    });
    return ok(after);
  },
});
