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

/** How often a silent step says that it is still at it. */
const PATIENCE_MS = 15_000;

/**
 * Says a step when it begins, and how long it took when that was a second or more.
 * @template T
 * @param {string} label
 * @param {() => T | Promise<T>} work
 * @param {{ silent?: boolean }} [options] silent: the work writes nothing itself, so a long one says now and then that it goes on
 * @returns {Promise<T>}
 */
export async function step(label, work, { silent = true } = {}) {
  const began = performance.now();
  const seconds = () => (performance.now() - began) / 1000;
  console.log(`· ${label} …`);
  const patience = silent
    ? setInterval(() => console.log(`  … ${label}: ${seconds().toFixed(0)} s so far`), PATIENCE_MS)
    : undefined;
  try {
    return await work();
  } finally {
    clearInterval(patience);
    if (seconds() >= 1) console.log(`  ${label}: ${seconds().toFixed(1)} s`);
  }
}

/**
 * Prints a failure as far as it helps: a Stop as its sentence, anything else whole.
 * @param {unknown} failure
 */
export function sayFailure(failure) {
  // By name: one process may hold this file twice (see child.mjs), and so two classes Stop.
  const isStop = failure instanceof Error && failure.name === 'Stop';
  console.error(isStop ? `\n${failure.message}\n` : failure);
}
