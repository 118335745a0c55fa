import { findCompany } from '../../../db/queries/company';
import { companySettings, getCompanyInput } from '../../contracts/company';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

export const getCompany = defineVerb({
  name: 'company.get',
  says: 'Read the company’s settings',
  kind: 'read',
  permission: 'company.read',
  http: { method: 'GET', path: '/api/company' },
  input: getCompanyInput,
  output: companySettings,
  async run({ scope }) {
    const company = await findCompany(scope);
    return company ? ok(company) : fail(notFound('company'));
  },
});
