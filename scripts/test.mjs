// npm test: every check there is, from a bare clone. `npm test -- server browser` runs those steps alone. Plain Node until npm's packages
// are there.
import { createRequire } from 'node:module';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { sayFailure, Stop } from './announce.mjs';
import { bootstrap } from './bootstrap.mjs';
import { endRunning } from './child.mjs';
import { whenAskedToEnd } from './end-requests.mjs';
import { chosenSteps, packagesFor, TEST_STEPS } from './test-steps.mjs';

const root = dirname(dirname(fileURLToPath(import.meta.url)));

let ending = false;
whenAskedToEnd(() => {
  ending = true;
  endRunning();
});

async function test() {
  const { steps, unknown } = chosenSteps(process.argv.slice(2));
  if (unknown.length > 0) {
    throw new Stop(`There is no step ${unknown.join(', ')}. The steps are: ${TEST_STEPS.map(({ name }) => name).join(', ')}.`);
  }
  await bootstrap({ root, packages: packagesFor(steps), command: 'npm test' });
  await import('tsx');
  const require = createRequire(import.meta.url);
  const { closingLine, exitCodeOf } = require('./closing-line.ts');
  const tally = await require('./run-tests.ts').runTests(root, steps, () => ending);
  if (ending) return 130;
  console.log(closingLine(tally));
  return exitCodeOf(tally);
}

try {
  process.exitCode = await test();
} catch (error) {
  if (!ending) sayFailure(error);
  process.exitCode = ending ? 130 : 1;
}
process.exit();
