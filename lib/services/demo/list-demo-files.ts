import { findCompany } from '../../../db/queries/company';
import { roleMay } from '../../auth/policy';
import { DEMO_FILES, listDemoFilesInput, listDemoFilesOutput } from '../../contracts/demo';
import { ok } from '../../domain/result';
import { defineVerb } from '../verb';

export const listDemoFiles = defineVerb({
  name: 'demo.files',
  says: 'List the files that the demo company can be tried with; none in any other company',
  kind: 'read',
  permission: 'self.use',
  http: { method: 'GET', path: '/api/demo/files' },
  input: listDemoFilesInput,
  output: listDemoFilesOutput,
  async run({ scope, actor }) {
    const company = await findCompany(scope);
    const seesBills = roleMay(actor.role, 'statements.read');
    const rows = DEMO_FILES.filter(({ kind }) => kind === 'ticket' || seesBills);
    return ok({ rows: company?.isDemo ? [...rows] : [] });
  },
});
