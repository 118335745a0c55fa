// `npm run check`: types, lint, format and unused code; no network, no database.
import { spawnSync } from 'node:child_process';
import { ensureDependencies, ROOT, requireNode } from './setup.mjs';

const bin = (name) => `node_modules/.bin/${name}`;
const STEPS = [
  ['types of the routes', bin('next'), ['typegen']],
  ['types', bin('tsc'), ['--noEmit']],
  ['lint and format', bin('biome'), ['ci', '--error-on-warnings', '.']],
  ['unused code', bin('knip'), []],
];

requireNode();
ensureDependencies();
let failed = 0;
for (const [what, command, args] of STEPS) {
  const done = spawnSync(command, args, { cwd: ROOT, stdio: 'inherit' });
  console.log(`${done.status === 0 ? 'ok' : 'FAILED'}: ${what}`);
  if (done.status !== 0) failed += 1;
}
process.exitCode = failed === 0 ? 0 : 1;
