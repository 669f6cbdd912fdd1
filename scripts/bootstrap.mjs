/**
 * Brings a bare clone to where the product's own code can run: the right Node, npm's packages, Debian's packages.
 * Plain Node without dependencies, since it is what installs them.
 */
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { step, Stop } from './announce.mjs';
import { run } from './child.mjs';
import { codeOf } from './error-code.mjs';
import { postgresBinaries } from './postgres-binaries.mjs';

const OLDEST_NODE = [20, 19, 0];

/** How to tell that a Debian package is there: by the file that is used of it. @type {Record<string, () => boolean>} */
const DEBIAN_PACKAGES = {
  postgresql: () => postgresBinaries() !== undefined,
  chromium: () => existsSync('/usr/bin/chromium'),
  'r-base-core': () => existsSync('/usr/bin/Rscript'),
  'r-cran-mass': () => ['library', 'site-library'].some((folder) => existsSync(`/usr/lib/R/${folder}/MASS/DESCRIPTION`)),
};

/**
 * @param {string} version such as 20.19.0
 * @returns {boolean} whether the product runs on that Node
 */
export function isNodeNewEnough(version) {
  const parts = version.split('.').map(Number);
  for (const [index, oldest] of OLDEST_NODE.entries()) {
    const part = parts[index] ?? 0;
    if (part !== oldest) return part > oldest;
  }
  return true;
}

/**
 * Whether what npm says it installed is what the lock file asks for. Optional packages for other machines may be missing.
 * @param {{ packages?: Record<string, { version?: string; optional?: boolean; devOptional?: boolean; link?: boolean }> }} lock package-lock.json
 * @param {{ packages?: Record<string, { version?: string }> }} installed node_modules/.package-lock.json
 * @returns {boolean}
 */
export function installMatchesLock(lock, installed) {
  const wanted = Object.entries(lock.packages ?? {}).filter(([path]) => path !== '');
  const there = installed.packages ?? {};
  const unwanted = Object.keys(there).some((path) => lock.packages?.[path] === undefined);
  if (wanted.length === 0 || unwanted) return false;
  return wanted.every(([path, { version, optional }]) => {
    const found = there[path];
    return found === undefined ? optional === true : found.version === version;
  });
}

/**
 * The line a person runs to install Debian packages.
 * @param {string[]} packages
 * @param {boolean} [asRoot] whether that person is root
 * @returns {string}
 */
export function installLine(packages, asRoot = false) {
  const sudo = asRoot ? '' : 'sudo ';
  return `${sudo}apt-get update && ${sudo}apt-get install -y --no-install-recommends ${packages.join(' ')}`;
}

/**
 * The sentence for someone who may not install.
 * @param {string[]} packages
 * @param {string} command what they typed, to be typed again
 * @returns {string}
 */
export function missingPackagesSentence(packages, command) {
  const these = packages.length === 1 ? 'a Debian package that is' : 'Debian packages that are';
  return `Tallyrod needs ${these} not installed: ${packages.join(', ')}.\nRun this line once, then ${command} again:\n\n  ${installLine(packages)}`;
}

function checkNode() {
  const version = process.versions.node;
  if (!isNodeNewEnough(version)) {
    throw new Stop(`Tallyrod needs Node ${OLDEST_NODE.join('.')} or newer; this is Node ${version}.`);
  }
}

/** @param {string} path */
const readJson = (path) => JSON.parse(readFileSync(path, 'utf8'));

/** @param {string} root */
async function ensureNpmPackages(root) {
  const lockFile = join(root, 'package-lock.json');
  const stamp = join(root, 'node_modules', '.tallyrod-lock');
  const installed = join(root, 'node_modules', '.package-lock.json');
  const hash = createHash('sha256').update(readFileSync(lockFile)).digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return;
  // A person who ran npm install by hand has what the lock asks for: taking that away to lay it again helps nobody.
  if (!existsSync(installed) || !installMatchesLock(readJson(lockFile), readJson(installed))) {
    await step('Installing npm packages (one to three minutes the first time)', async () => {
      const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--no-update-notifier'];
      const { code } = await run('npm', args, { cwd: root, show: true });
      if (code !== 0) throw new Stop('npm ci did not finish: what it said is above. Nothing else was started.');
    });
  }
  writeFileSync(stamp, hash);
}

async function haveFreeSudo() {
  try {
    return (await run('sudo', ['-n', 'true'])).code === 0;
  } catch (error) {
    if (['ENOENT', 'EACCES'].includes(codeOf(error) ?? '')) return false;
    throw error;
  }
}

/**
 * @param {string[]} packages
 * @param {string} command
 */
async function ensureDebianPackages(packages, command) {
  const isMissing = (/** @type {string} */ name) => DEBIAN_PACKAGES[name]?.() !== true;
  const missing = packages.filter(isMissing);
  if (missing.length === 0) return;
  if (!existsSync('/usr/bin/apt-get')) {
    throw new Stop(
      `Tallyrod needs ${missing.join(', ')}, and installs them only on Debian. Install them, then ${command} again.`,
    );
  }
  const isRoot = process.getuid?.() === 0;
  if (!isRoot && !(await haveFreeSudo())) throw new Stop(missingPackagesSentence(missing, command));
  const apt = async (/** @type {string[]} */ ...args) => {
    const line = ['DEBIAN_FRONTEND=noninteractive', 'apt-get', '-o', 'DPkg::Lock::Timeout=120', '-q', ...args];
    const { code } = isRoot ? await run('env', line, { show: true }) : await run('sudo', ['-n', 'env', ...line], { show: true });
    return code;
  };
  await step(
    `Installing Debian packages: ${missing.join(', ')}`,
    async () => {
      await apt('update');
      const code = await apt('install', '-y', '--no-install-recommends', ...missing);
      const still = missing.filter(isMissing);
      if (code !== 0 || still.length > 0) {
        throw new Stop(`apt-get could not install ${(still.length > 0 ? still : missing).join(', ')}: what it said is above.`);
      }
    },
    { silent: false },
  );
}

/**
 * Everything that must be there before the product's own code can run. Throws a Stop with a sentence when it cannot be.
 * @param {{ root: string; packages: string[]; command: string }} options root: the clone; packages: Debian's, by name;
 *   command: what the person typed
 */
export async function bootstrap({ root, packages, command }) {
  checkNode();
  const unknown = packages.filter((name) => !Object.hasOwn(DEBIAN_PACKAGES, name));
  if (unknown.length > 0) throw new Error(`no way to tell whether ${unknown.join(', ')} is installed`);
  await ensureDebianPackages(packages, command);
  await ensureNpmPackages(root);
}
