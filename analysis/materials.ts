import { AnalysisError } from './analysis-error';
import { inRange, lengthFromZero, notNegative, positive, positiveLength } from './check-input';
import type { ShimPack } from './types';
import type { Nm } from './units';

/** Amounts that the search holds at once: a pack of shims is never so fine. */
const MOST_AMOUNTS = 200_000;
const MOST_SHIMS = 10_000;

function greatestCommonDivisor(a: Nm, b: Nm): Nm {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}

function checkedThicknesses(thicknesses: readonly Nm[]): Nm[] {
  const sizes = [...new Set(thicknesses.map((thickness) => positiveLength('shim', thickness)))].sort((a, b) => b - a);
  if (sizes.length === 0) throw new AnalysisError('no-shims', 'There are no shims to choose from.');
  const odd = sizes.find((size) => !Number.isInteger(size));
  if (odd !== undefined) throw new AnalysisError('not-whole', `A shim is whole nanometres thick, got ${odd}.`, { value: odd });
  return sizes;
}

/** Fewest coins for every amount up to `most` units, and the last coin of each way; 0 coins for amount 0, none where unreachable. */
function fewestFor(most: number, coins: readonly number[]): { fewest: Float64Array; last: Int32Array } {
  const fewest = new Float64Array(most + 1).fill(Infinity);
  const last = new Int32Array(most + 1).fill(-1);
  fewest[0] = 0;
  for (let amount = 1; amount <= most; amount += 1) {
    for (const [index, coin] of coins.entries()) {
      const before = amount >= coin ? (fewest[amount - coin] ?? Infinity) : Infinity;
      if (before + 1 < (fewest[amount] ?? Infinity)) {
        fewest[amount] = before + 1;
        last[amount] = index;
      }
    }
  }
  return { fewest, last };
}

/**
 * The fewest shims that fill a gap to within half the thinnest of them, thickest first; of packs alike in number the closest, and of those
 * the thinner one. `rest` is the gap less the pack: negative when the pack stands proud, which it may by no more than that half.
 * @throws AnalysisError 'no-shims' | 'not-positive' | 'not-whole' | 'not-finite' | 'negative' | 'gap-too-deep' | 'shims-too-unlike'
 */
export function shimPack(gap: Nm, thicknesses: Nm[]): ShimPack {
  const space = lengthFromZero('gap', gap);
  const sizes = checkedThicknesses(thicknesses);
  const thickest = sizes[0] ?? 0;
  const half = (sizes.at(-1) ?? 0) / 2;
  if (space / thickest > MOST_SHIMS) throw new AnalysisError('gap-too-deep', 'No stack of shims is so deep.', { gap });
  const unit = sizes.reduce(greatestCommonDivisor);
  const coins = sizes.map((size) => size / unit);
  const widest = coins[0] ?? 1;
  // Among fewest shims, fewer than `widest` are not of the thickest kind: any `widest` of them hold some that add up to whole thickest ones.
  const searched = widest * widest + 2 * widest;
  const ahead = Math.max(0, Math.floor(space / thickest) - Math.floor(searched / widest) + 1);
  const left = space - ahead * thickest;
  const most = Math.floor((left + half) / unit);
  if (most > MOST_AMOUNTS)
    throw new AnalysisError('shims-too-unlike', 'These shims have no common measure to pack by.', { thicknesses });
  const { fewest, last } = fewestFor(most, coins);
  let chosen = -1;
  for (let amount = Math.max(0, Math.ceil((left - half) / unit)); amount <= most; amount += 1) {
    const count = fewest[amount] ?? Infinity;
    const best = chosen < 0 ? Infinity : (fewest[chosen] ?? Infinity);
    const closer = chosen >= 0 && Math.abs(left - amount * unit) < Math.abs(left - chosen * unit);
    if (count < best || (count === best && count < Infinity && closer)) chosen = amount;
  }
  const shims = Array.from({ length: ahead }, () => thickest);
  for (let amount = chosen; amount > 0;) {
    const size = sizes[last[amount] ?? -1];
    if (size === undefined) break;
    shims.push(size);
    amount -= size / unit;
  }
  shims.sort((a, b) => b - a);
  return { shims, rest: space - shims.reduce((sum, size) => sum + size, 0) };
}

export interface MaterialNeed {
  /** Cubic metres, without and with waste. */
  volume: number;
  withWaste: number;
  unit: string;
  /** Bags or cans to the fraction, and to buy. */
  exact: number;
  whole: number;
}

/** Rounding of a quotient must not buy a bag more. */
const SAME_COUNT = 1e-9;

/**
 * What to buy for a volume: whole bags or cans, rounded up, beside the exact figure.
 * @param volume cubic metres
 * @param options.yield cubic metres that one unit gives, as its label says
 * @param options.waste fraction lost, 0.1 for 10 %
 * @throws AnalysisError 'not-finite' | 'negative' | 'not-positive' | 'fraction-over-one' | 'out-of-range'
 */
export function materials(volume: number, options: { yield: number; waste: number; unit: string }): MaterialNeed {
  const net = notNegative('volume', volume);
  const waste = notNegative('waste', options.waste);
  if (waste > 1) throw new AnalysisError('fraction-over-one', 'Waste is a fraction of the volume: 0.1 for 10 %.', { waste });
  const withWaste = inRange('withWaste', net * (1 + waste));
  const exact = inRange('exact', withWaste / positive('yield', options.yield));
  const nearest = Math.round(exact);
  const whole = Math.abs(exact - nearest) <= SAME_COUNT * Math.max(1, nearest) ? nearest : Math.ceil(exact);
  return { volume: net, withWaste, unit: options.unit, exact, whole };
}
