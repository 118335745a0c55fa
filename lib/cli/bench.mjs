import { register } from 'tsx/esm/api';

/** `npm run bench -- rating|matching`: prints how fast the core is on this machine. */

const NAMES = ['rating', 'matching'];

register();
const { runBench } = await import('./bench-core.ts');
const wanted = process.argv.slice(2);
for (const name of wanted.length > 0 ? wanted : NAMES) {
  if (!runBench(name)) {
    console.error(`There is no bench "${name}"; there are ${NAMES.join(' and ')}.`);
    process.exit(1);
  }
}
