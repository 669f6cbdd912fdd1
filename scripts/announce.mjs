/**
 * What the two commands say to the person who typed them. Plain Node without dependencies: it speaks before `npm ci` has run.
 */

/** Something the person at the keyboard can mend. Shown as its sentence alone; every other error is shown with its stack. */
export class Stop extends Error {
  /** @param {string} sentence */
  constructor(sentence) {
    super(sentence);
    this.name = 'Stop';
  }
}

/**
 * Says a step when it begins, and how long it took when that was a second or more.
 * @template T
 * @param {string} label
 * @param {() => T | Promise<T>} work
 * @returns {Promise<T>}
 */
export async function step(label, work) {
  const began = performance.now();
  console.log(`· ${label} …`);
  const result = await work();
  const seconds = (performance.now() - began) / 1000;
  if (seconds >= 1) console.log(`  took ${seconds.toFixed(1)} s`);
  return result;
}

/**
 * Prints a failure as far as it helps: a Stop as its sentence, anything else whole.
 * @param {unknown} failure
 */
export function sayFailure(failure) {
  console.error(failure instanceof Stop ? `\n${failure.message}\n` : failure);
}
