// npm start: everything that a person needs to open the product in a browser, from a bare clone. Plain Node until npm's packages are there.
import { createRequire } from 'node:module';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { sayFailure } from './announce.mjs';
import { bootstrap } from './bootstrap.mjs';
import { endRunning } from './child.mjs';
import { whenAskedToEnd } from './end-requests.mjs';
import { takeSingleStart } from './single-start.mjs';

const root = dirname(dirname(fileURLToPath(import.meta.url)));

let ending = false;
const askedToEnd = new Promise((resolve) => {
  whenAskedToEnd(() => {
    ending = true;
    endRunning();
    resolve('asked');
  });
});

async function start() {
  const mark = await takeSingleStart(root);
  if ('running' in mark) {
    const { pid, address } = mark.running;
    const where = address === null ? 'still on its way up' : `at ${address}`;
    console.log(`Tallyrod is running already: process ${pid}, ${where}. End that one with Ctrl-C first.`);
    return address === null ? 1 : 0;
  }
  await bootstrap({ root, packages: process.env.DATABASE_URL ? [] : ['postgresql'], command: 'npm start' });
  await import('tsx');
  const { startProduct } = createRequire(import.meta.url)('./start-product.ts');
  if (ending) return 130;
  const product = await startProduct(root, 0);
  mark.setAddress(product.address);
  const reason = await Promise.race([askedToEnd, product.ended.then(() => 'server')]);
  console.log(reason === 'server' ? '\nThe server ended of itself. Ending the rest …' : '\nEnding …');
  await product.stop();
  return reason === 'server' ? 1 : 0;
}

try {
  process.exitCode = await start();
} catch (error) {
  // A step that our own ending cut short has nothing to report.
  if (!ending) sayFailure(error);
  process.exitCode = ending ? 130 : 1;
}
process.exit();
