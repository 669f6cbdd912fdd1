const SIGNALS = ['SIGINT', 'SIGTERM', 'SIGHUP'];

/** How often to look whether npm is still there. */
const LOOK_MS = 500;

/**
 * Calls back once, when somebody wants this command to end: a Ctrl-C, a signal, or a signal to npm. Of the last npm tells only the shell that it
 * put between itself and us, which ends without a word; what we see is that our parent is gone. npm also passes on a Ctrl-C that the
 * terminal sent us already, so a second request says nothing new.
 * @param {() => void} callback
 */
export function whenAskedToEnd(callback) {
  let asked = false;
  const ask = () => {
    if (asked) return;
    asked = true;
    callback();
  };
  for (const signal of SIGNALS) process.on(signal, ask);
  // Without npm above us a parent that leaves, such as a shell that is closed over a background job, means nothing.
  if (process.env.npm_lifecycle_event === undefined) return;
  const parent = process.ppid;
  setInterval(() => process.ppid !== parent && ask(), LOOK_MS).unref();
}
