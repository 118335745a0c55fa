import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { findCompany } from '../../../db/queries/company';
import { roleMay } from '../../auth/policy';
import { fileAnswer } from '../../contracts/common';
import { DEMO_FILES, getDemoFileInput } from '../../contracts/demo';
import { fail, ok } from '../../domain/result';
import { notFound } from '../failure';
import { defineVerb } from '../verb';

const FOLDERS = { statement: 'statements', ticket: 'tickets' } as const;

export const getDemoFile = defineVerb({
  name: 'demo.file',
  says: 'Download a file that the demo company can be tried with',
  kind: 'read',
  permission: 'self.use',
  http: { method: 'GET', path: '/api/demo/files/{name}' },
  input: getDemoFileInput,
  output: fileAnswer,
  async run({ scope, actor }, { name }) {
    const file = DEMO_FILES.find((one) => one.name === name);
    const company = await findCompany(scope);
    const mayHave = file?.kind === 'ticket' || roleMay(actor.role, 'statements.read');
    if (!file || !company?.isDemo || !mayHave) return fail(notFound('file'));
    const bytes = await readFile(path.join('tests', 'fixtures', FOLDERS[file.kind], name));
    return ok({
      bytes: new Uint8Array(bytes),
      mediaType: file.kind === 'ticket' ? 'image/jpeg' : 'text/csv',
      fileName: name,
      inline: false,
    });
  },
});
