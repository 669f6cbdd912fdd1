import { fitPlane } from '../analysis/plane-fit';
import { solveQuickly } from '../analysis/plane-solve-quick';
import { measureExtent } from '../analysis/plane-solution';
let st = 20261201;
const u = () => {
  st = (st * 48271) % 2147483647;
  return st / 2147483647;
};
const mk = (n: number) =>
  Array.from({ length: n }, (_, i) => {
    const x = Math.round(3e10 * u()),
      y = Math.round(2e10 * u());
    return {
      id: 'S' + i,
      x,
      y,
      z: Math.round((4e5 + 1.2e-4 * x - 0.8e-4 * y + (u() + u() + u() - 1.5) * 2e6) / 1587500) * 1587500,
    };
  });
const cpu = () => {
  const c = process.cpuUsage();
  return c.user + c.system;
};
for (const n of [40, 1000, 10000, 100000]) {
  const p = mk(n);
  const solo = () => solveQuickly(p, measureExtent(p));
  for (const [nm, f] of [
    ['fit', () => fitPlane(p)],
    ['solve', solo],
    ['extent', () => measureExtent(p)],
  ] as const) {
    const reps = Math.max(8, Math.ceil(4e6 / n / (n > 5000 ? 4 : 1)));
    for (let i = 0; i < reps / 3; i++) f();
    const ts: number[] = [];
    for (let k = 0; k < 9; k++) {
      const t = cpu();
      const m = Math.max(1, Math.round(reps / 9));
      for (let i = 0; i < m; i++) f();
      ts.push((cpu() - t) / m);
    }
    ts.sort((a, b) => a - b);
    console.log(n, nm, ts[4]!.toFixed(2), 'us cpu', ((ts[4]! / n) * 1000).toFixed(0), 'ns/pt');
  }
}
