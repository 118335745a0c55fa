// `npm run app`: from a fresh clone to a running product. Plain Node without packages: it runs
// before anything is installed.
import { connect } from 'node:net';
import { createInterface } from 'node:readline';
import {
  ensureBuild,
  ensureDependencies,
  requireNode,
  startServer,
  stop,
  waitUntilUp,
} from './setup.mjs';

const port = Number(process.env.PORT ?? 3000);
const host = process.env.HOST ?? '127.0.0.1';
const address = process.env.APP_ORIGIN ?? `http://localhost:${port}`;

/** Whether something answers on the port already. */
function isTaken() {
  return new Promise((resolve) => {
    const probe = connect({ port, host: '127.0.0.1' });
    probe.once('connect', () => {
      probe.destroy();
      resolve(true);
    });
    probe.once('error', () => resolve(false));
  });
}

/** The demo company's people, or none where there is no demo company. */
async function demoSignIns() {
  try {
    const answer = await fetch(`http://127.0.0.1:${port}/api/sign-in-hints`);
    return (await answer.json()).demo;
  } catch {
    return null;
  }
}

function printWelcome(demo) {
  console.log(`\nStrikeoff is ready: ${address}`);
  if (demo) {
    console.log(`\nThe demo company, ${demo.companyName}; the password is "${demo.password}":`);
    const width = Math.max(...demo.people.map(({ email }) => email.length));
    for (const { name, email, role } of demo.people) {
      console.log(`  ${email.padEnd(width)}  ${name}, ${role}`);
    }
  }
  console.log('\nCtrl-C ends it.');
}

requireNode();
if (!Number.isInteger(port) || port < 1 || port > 65_535)
  stop(`PORT is ${process.env.PORT}, which is no port.`);
ensureDependencies();
ensureBuild();
if (await isTaken()) {
  stop(
    `Port ${port} is taken: another program, perhaps another Strikeoff, listens there. Stop it, ` +
      `or choose another port, for example: PORT=${port + 1} npm run app`,
  );
}

let code = null;
const server = startServer({
  port,
  host,
  env: { LOG_LEVEL: process.env.LOG_LEVEL ?? 'warn' },
  stdio: ['ignore', 'pipe', 'inherit'],
});
// The product's log is JSON lines; the framework's banner would only hide the welcome.
createInterface({ input: server.stdout }).on('line', (line) => {
  if (line.startsWith('{')) console.log(line);
});
server.once('exit', (status, signal) => {
  code = status ?? (signal ? 1 : 0);
  // What went wrong was said by the server itself.
  process.exit(code);
});
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));

if (await waitUntilUp(port, { isDead: () => code !== null })) printWelcome(await demoSignIns());
else if (code === null) {
  server.kill('SIGTERM');
  stop('The server did not answer within two minutes; start it with npm start to see why.');
}
