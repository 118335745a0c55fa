import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { BILLING_SUPPLIERS, billFile } from './bill-files';
import { billedIn } from './settle-months';

/** Writes the demo's statements as their suppliers would send them; `npm run demo-bills`. */
const FOLDER = path.join('tests', 'fixtures', 'statements');

mkdirSync(FOLDER, { recursive: true });
for (const month of ['2026-09', '2026-10', '2026-11']) {
  for (const supplier of BILLING_SUPPLIERS) {
    if (!billedIn(month).includes(supplier)) continue;
    const { name, bytes } = billFile(supplier, month);
    writeFileSync(path.join(FOLDER, name), bytes);
    console.log(path.join(FOLDER, name));
  }
}
