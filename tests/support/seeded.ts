/** Numbers from 0 to 1, the same for the same seed: Park and Miller's minimal standard generator (x ← 48271·x mod 2^31 − 1). */
export function seeded(seed: number): () => number {
  let state = (Math.abs(Math.trunc(seed)) % 2_147_483_646) + 1;
  return () => {
    state = (state * 48_271) % 2_147_483_647;
    return (state - 0.5) / 2_147_483_647;
  };
}

/** Standard normal numbers by Box and Muller from uniform ones. */
export function normal(uniform: () => number): () => number {
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}
