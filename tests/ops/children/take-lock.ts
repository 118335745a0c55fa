import { lockDataFolder } from '../../../db/lock';

/** Takes the lock at a given moment, says how it went, and holds it until it is ended. */
const [folder = '', at = '0'] = process.argv.slice(2);
while (Date.now() < Number(at)) {
  // All contenders begin at the same moment.
}
try {
  lockDataFolder(folder);
  console.log('got it');
  setTimeout(() => {}, 60_000);
} catch (error) {
  console.log(error instanceof Error ? `${error.name}: ${error.message}` : error);
}
