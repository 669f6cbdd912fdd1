/**
 * The code of a system error, such as ENOENT; undefined for anything else. Asked of its shape: under a test runner, which gives each file a
 * world of its own, an error of Node's is no instance of that world's Error.
 * @param {unknown} error
 * @returns {string | undefined}
 */
export function codeOf(error) {
  const code = typeof error === 'object' && error !== null && 'code' in error ? error.code : undefined;
  return typeof code === 'string' ? code : undefined;
}
