import { createRequire } from 'node:module';
import path from 'node:path';
import { bundle } from './bundle';
import { runTestFile } from './light-runner';
import type { Mutant } from './sites';

/** A test file to run, over the change to make; null for none. */
export interface Task {
  test: string;
  mutant: Mutant | null;
}

export interface Outcome {
  passed: boolean;
  message: string;
}

const requireFromRoot = createRequire(path.resolve(__dirname, '../../package.json'));

async function outcomeOf({ test, mutant }: Task): Promise<Outcome> {
  try {
    const { code } = await bundle(test, mutant);
    const load = new Function('require', 'module', 'exports', code);
    await runTestFile(() => load(requireFromRoot, { exports: {} }, {}));
    return { passed: true, message: '' };
  } catch (error) {
    return { passed: false, message: error instanceof Error ? error.message.slice(0, 400) : String(error) };
  }
}

process.on('message', (task: Task) => {
  void outcomeOf(task).then((outcome) => process.send?.(outcome));
});
