import { type ChildProcess, fork } from 'node:child_process';
import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { bundle } from './mutation/bundle';
import { type Mutant, mutantsOf } from './mutation/sites';
import type { Outcome, Task } from './mutation/worker';

/**
 * Changes one operator, constant or comparison of analysis/ at a time and runs the tests that reach it, quickest first, until one fails. Prints the
 * share that was caught and every survivor.
 *
 * `node --import tsx scripts/mutate-analysis.ts [--count 400] [--seed 1] [--files plane,screening] [--all] [--workers 2]`; exit code 1 under 90 %.
 */

const root = path.resolve(__dirname, '..');
const TESTS = 'tests/analysis';
/** A test that takes this many times its usual time, and this many milliseconds besides, hangs: the change is caught. */
const SLOWER = 8;
const GRACE = 10_000;
const CAUGHT_AT_LEAST = 0.9;

function option(name: string, usual: string): string {
  const at = process.argv.indexOf(`--${name}`);
  return at === -1 ? usual : (process.argv[at + 1] ?? usual);
}

/** Park and Miller's minimal standard generator: the same sample for the same seed. */
function sample<T>(items: readonly T[], count: number, seed: number): T[] {
  const left = [...items];
  let state = seed;
  const chosen: T[] = [];
  while (chosen.length < count && left.length > 0) {
    state = (state * 48_271) % 2_147_483_647;
    chosen.push(...left.splice(state % left.length, 1));
  }
  return chosen;
}

/** A child process that runs one test file at a time; killed and replaced when it hangs. */
class Runner {
  private child: ChildProcess | null = null;

  run(task: Task, limit: number): Promise<Outcome> {
    const child = this.child ?? fork(path.join(__dirname, 'mutation/worker.ts'), { execArgv: ['--import', 'tsx'], cwd: root });
    this.child = child;
    return new Promise((resolve) => {
      const done = (outcome: Outcome): void => {
        clearTimeout(timer);
        child.removeAllListeners();
        resolve(outcome);
      };
      const timer = setTimeout(() => {
        this.end();
        done({ passed: false, message: `no answer in ${Math.round(limit / 1000)} s` });
      }, limit);
      child.once('message', (outcome: Outcome) => done(outcome));
      child.once('exit', (code) => {
        this.child = null;
        done({ passed: false, message: `the runner ended with ${code}` });
      });
      child.send(task);
    });
  }

  end(): void {
    this.child?.kill('SIGKILL');
    this.child = null;
  }
}

interface Test {
  file: string;
  inputs: Set<string>;
  milliseconds: number;
}

/** Every test once on unchanged sources: they must pass, and their times order them. */
async function baseline(runner: Runner): Promise<Test[]> {
  const tests: Test[] = [];
  for (const name of readdirSync(path.join(root, TESTS)).filter((entry) => entry.endsWith('.test.ts'))) {
    const file = `${TESTS}/${name}`;
    const { inputs } = await bundle(file, null);
    const from = performance.now();
    const outcome = await runner.run({ test: file, mutant: null }, 300_000);
    if (!outcome.passed) throw new Error(`${file} fails on unchanged sources: ${outcome.message}`);
    tests.push({ file, inputs: new Set(inputs), milliseconds: performance.now() - from });
  }
  return tests.sort((a, b) => a.milliseconds - b.milliseconds);
}

/** The tests that reach a file: those that carry its name first, then the quickest. */
function testsFor(file: string, tests: readonly Test[]): Test[] {
  const name = path.basename(file, '.ts');
  const reach = tests.filter(({ inputs }) => inputs.has(file));
  const own = (test: Test): boolean => path.basename(test.file).startsWith(name);
  return [...reach.filter(own), ...reach.filter((test) => !own(test))];
}

async function isCaught(mutant: Mutant, tests: readonly Test[], runner: Runner): Promise<boolean> {
  for (const { file, milliseconds } of testsFor(mutant.file, tests)) {
    const { passed } = await runner.run({ test: file, mutant }, SLOWER * milliseconds + GRACE);
    if (!passed) return true;
  }
  return false;
}

async function main(): Promise<void> {
  const started = Date.now();
  const wanted = option('files', '').split(',');
  const sources = readdirSync(path.join(root, 'analysis')).filter(
    (name) => name.endsWith('.ts') && wanted.some((part) => name.includes(part)),
  );
  const all = sources.flatMap((name) => mutantsOf(`analysis/${name}`, readFileSync(path.join(root, 'analysis', name), 'utf8')));
  const seed = Number(option('seed', '1'));
  const chosen = process.argv.includes('--all') ? all : sample(all, Number(option('count', '400')), seed);
  const runners = Array.from({ length: Number(option('workers', '2')) }, () => new Runner());
  const [first] = runners;
  if (first === undefined) throw new Error('At least one worker is needed.');
  const tests = await baseline(first);
  console.log(
    `${all.length} possible changes in ${sources.length} files; ${chosen.length} of them, seed ${seed}; ${tests.length} test files pass unchanged`,
  );
  const survivors: Mutant[] = [];
  const queue = [...chosen];
  let done = 0;
  await Promise.all(
    runners.map(async (runner) => {
      for (let mutant = queue.shift(); mutant !== undefined; mutant = queue.shift()) {
        if (!(await isCaught(mutant, tests, runner))) {
          survivors.push(mutant);
          console.log(`survived  ${mutant.file}:${mutant.line}  ${mutant.before} → ${mutant.after}`);
        }
        done += 1;
        if (done % 50 === 0)
          console.log(
            `${done} of ${chosen.length}, ${survivors.length} survived, ${Math.round((Date.now() - started) / 1000)} s`,
          );
      }
      runner.end();
    }),
  );
  const share = (chosen.length - survivors.length) / chosen.length;
  console.log(
    `\ncaught ${chosen.length - survivors.length} of ${chosen.length} (${(100 * share).toFixed(1)} %) in ${Math.round((Date.now() - started) / 1000)} s`,
  );
  for (const { file, line, before, after } of survivors.sort((a, b) => a.file.localeCompare(b.file) || a.line - b.line))
    console.log(`  ${file}:${line}  ${before} → ${after}`);
  process.exitCode = share < CAUGHT_AT_LEAST ? 1 : 0;
}

void main();
