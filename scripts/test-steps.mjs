/**
 * The steps of `npm test`, in the order they run: what is quick to fail comes first. packages are Debian's that the step needs; cluster says
 * whether it needs PostgreSQL running.
 */
export const TEST_STEPS = [
  { name: 'lint', packages: [], cluster: false },
  { name: 'types', packages: [], cluster: false },
  { name: 'analysis', packages: ['r-base-core', 'r-cran-mass'], cluster: false },
  { name: 'shared', packages: [], cluster: false },
  { name: 'scripts', packages: ['postgresql'], cluster: false },
  { name: 'server', packages: ['postgresql'], cluster: true },
  { name: 'components', packages: [], cluster: false },
  { name: 'browser', packages: ['postgresql', 'chromium'], cluster: true },
];

/**
 * The steps that were asked for, in their order; all when none was named.
 * @param {string[]} names
 * @returns {{ steps: typeof TEST_STEPS; unknown: string[] }} unknown: names that are no step
 */
export function chosenSteps(names) {
  const unknown = names.filter((name) => !TEST_STEPS.some((known) => known.name === name));
  return { steps: names.length === 0 ? TEST_STEPS : TEST_STEPS.filter(({ name }) => names.includes(name)), unknown };
}

/**
 * Debian's packages for these steps, each once.
 * @param {typeof TEST_STEPS} steps
 * @returns {string[]}
 */
export const packagesFor = (steps) => [...new Set(steps.flatMap(({ packages }) => packages))];
