import { mkdtempSync, existsSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { step } from './announce.mjs';
import { run } from './child.mjs';
import { addTallies, NOTHING, tallyOfCheck, tallyOfJest, type Tally } from './closing-line';
import { startThrowAwayCluster, type ThrowAwayCluster } from './throw-away-cluster';

/** A step of `npm test`; see test-steps.mjs. */
export interface TestStep {
  name: string;
  cluster: boolean;
}

/** Steps that are one check each. Every other step is jest's project of that name. */
const CHECKS: Record<string, string[][]> = {
  lint: [['eslint/bin/eslint.js', '.', '--max-warnings', '0']],
  types: [
    ['typescript/bin/tsc', '--noEmit'],
    ['typescript/bin/tsc', '--noEmit', '-p', 'analysis/tsconfig.json'],
  ],
};

/** Chromium and the product beside it want the machine for themselves. */
const ONE_AT_A_TIME = ['browser'];

const runTool = async (root: string, [script = '', ...args]: string[], env: Record<string, string>): Promise<number> => {
  const file = join(root, 'node_modules', script);
  const { code } = await run(process.execPath, [file, ...args], { cwd: root, env: { ...process.env, ...env }, show: true });
  return code;
};

async function runCheck(root: string, commands: string[][]): Promise<Tally> {
  let worst = 0;
  for (const command of commands) worst = Math.max(worst, await runTool(root, command, {}));
  return tallyOfCheck(worst);
}

async function runJest(root: string, project: string, cluster: ThrowAwayCluster | undefined): Promise<Tally> {
  const folder = mkdtempSync(join(tmpdir(), 'tallyrod-report-'));
  try {
    const file = join(folder, 'report.json');
    const workers = ONE_AT_A_TIME.includes(project) ? '--runInBand' : '--maxWorkers=2';
    const args = ['jest/bin/jest.js', '--selectProjects', project, workers, '--json', '--outputFile', file];
    const env = { NODE_ENV: 'test', ...(cluster === undefined ? {} : { TEST_CLUSTER_URL: cluster.superUrl }) };
    const code = await runTool(root, args, env);
    return tallyOfJest(existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : undefined, code);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/**
 * Runs steps one after the other, each to its end whatever the one before came to, and shows their output.
 *
 * @param isEnding asked between steps: whether somebody wants it over
 * @returns the sum of what they counted
 */
export async function runTests(root: string, steps: readonly TestStep[], isEnding: () => boolean): Promise<Tally> {
  const cluster = steps.some((each) => each.cluster)
    ? await step('Starting a throw-away PostgreSQL', startThrowAwayCluster)
    : undefined;
  try {
    let sum = NOTHING;
    for (const { name, cluster: needsCluster } of steps) {
      if (isEnding()) break;
      const checks = CHECKS[name];
      const work = (): Promise<Tally> =>
        checks ? runCheck(root, checks) : runJest(root, name, needsCluster ? cluster : undefined);
      const tally = await step(name, work, { silent: false });
      console.log(`  ${name}: ${tally.passed} passed, ${tally.failed} failed\n`);
      sum = addTallies(sum, tally);
    }
    return sum;
  } finally {
    await cluster?.end();
  }
}
