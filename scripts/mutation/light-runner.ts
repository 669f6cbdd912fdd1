import { bind } from 'jest-each';
import { expect } from 'expect';

type Body = () => unknown;

interface Suite {
  before: Body[];
  after: Body[];
  beforeEach: Body[];
  afterEach: Body[];
  tests: { title: string; body: Body }[];
  suites: Suite[];
}

const emptySuite = (): Suite => ({ before: [], after: [], beforeEach: [], afterEach: [], tests: [], suites: [] });

async function runSuite(suite: Suite, each: { before: Body[]; after: Body[] }): Promise<void> {
  const before = [...each.before, ...suite.beforeEach];
  const after = [...suite.afterEach, ...each.after];
  for (const body of suite.before) await body();
  for (const { body } of suite.tests) {
    for (const step of before) await step();
    await body();
    for (const step of after) await step();
  }
  for (const inner of suite.suites) await runSuite(inner, { before, after });
  for (const body of suite.after) await body();
}

/**
 * Runs one bundled test file with the globals that the analysis tests use, stopping at the first failure: what jest would do, without the seconds
 * that it takes to start. Rejects with the failure.
 */
export async function runTestFile(load: () => void): Promise<void> {
  const root = emptySuite();
  let current = root;
  const describe = (_: string, define: Body): void => {
    const suite = emptySuite();
    current.suites.push(suite);
    const outer = current;
    current = suite;
    define();
    current = outer;
  };
  const it = (title: string, body: Body): void => {
    current.tests.push({ title, body });
  };
  Object.assign(globalThis, {
    expect,
    describe: Object.assign(describe, { each: bind(describe) }),
    it: Object.assign(it, { each: bind(it) }),
    test: Object.assign(it, { each: bind(it) }),
    beforeAll: (body: Body) => current.before.push(body),
    afterAll: (body: Body) => current.after.push(body),
    beforeEach: (body: Body) => current.beforeEach.push(body),
    afterEach: (body: Body) => current.afterEach.push(body),
  });
  load();
  await runSuite(root, { before: [], after: [] });
}
