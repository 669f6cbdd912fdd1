import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { chosenSteps, packagesFor, TEST_STEPS } from '../../scripts/test-steps.mjs';

const names = (steps: { name: string }[]): string[] => steps.map(({ name }) => name);

describe('the steps of npm test', () => {
  it('are all of them when none is named', () => {
    expect(chosenSteps([]).steps).toEqual(TEST_STEPS);
  });

  it('are those named, in their own order, each once', () => {
    expect(names(chosenSteps(['browser', 'server', 'browser']).steps)).toEqual(['server', 'browser']);
  });

  it('tell which name is no step', () => {
    expect(chosenSteps(['server', 'serve'])).toEqual({ steps: expect.anything(), unknown: ['serve'] });
  });

  it('leave out none of the folders that hold tests', () => {
    const folders = readdirSync(join(__dirname, '..'), { withFileTypes: true }).filter((entry) => entry.isDirectory());
    // hooks/ is run by the components' project; support/ and reference/ hold no tests.
    const withoutStep = ['hooks', 'support', 'reference'];
    const tested = folders.map(({ name }) => name).filter((name) => !withoutStep.includes(name));
    expect(names(TEST_STEPS)).toEqual(expect.arrayContaining(tested));
  });

  it('ask for Debian’s packages once, and for none where none is needed', () => {
    expect(packagesFor(chosenSteps(['server', 'browser']).steps)).toEqual(['postgresql', 'chromium']);
    expect(packagesFor(chosenSteps(['lint', 'components']).steps)).toEqual([]);
  });
});
