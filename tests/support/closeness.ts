/** |actual − expected| as a share of |expected|; 0 where both are the same, Infinity where only one is zero, null or not finite. */
export function relativeError(actual: number | null | undefined, expected: number | null | undefined): number {
  if (Object.is(actual, expected) || actual === expected) return 0;
  if (actual == null || expected == null || !Number.isFinite(actual) || !Number.isFinite(expected) || expected === 0)
    return Infinity;
  return Math.abs(actual - expected) / Math.abs(expected);
}

/** The names of the pairs that stand further apart than `limit`, each with its two values: empty is what a test expects. */
export function apart(
  pairs: Iterable<readonly [string, number | null | undefined, number | null | undefined]>,
  limit: number,
): string[] {
  const found: string[] = [];
  for (const [name, actual, expected] of pairs) {
    const error = relativeError(actual, expected);
    if (!(error <= limit)) found.push(`${name}: ${String(actual)} against ${String(expected)}, ${error.toExponential(1)} apart`);
  }
  return found;
}
