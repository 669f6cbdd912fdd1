import { AnalysisError } from './analysis-error';
import { lengthFromZero, nanometres } from './check-input';
import type { BedRule, Tolerance } from './types';
import { NM_PER_INCH, NM_PER_METRE, NM_PER_MILLIMETRE, type Nm } from './units';

/** How a rule's numbers are known here. `seen`: read in an excerpt of what is named; `own`: the user's. */
export type Knowledge = 'seen' | 'from-memory' | 'common-practice' | 'own';

export interface RuleSource {
  title: string;
  edition: string;
  place: string;
  /** Where the excerpt stood, when it was not the document itself. */
  seenIn?: string;
}

interface RuleOrigin {
  /** Stable key: the screens' words for it stand in the catalogue. */
  id: string;
  known: Knowledge;
  /** Null where nobody has published it. */
  source: RuleSource | null;
}

/** Limits of elevation against plan grade; positive is high. */
export interface ToleranceRule extends RuleOrigin {
  surface: 'top';
  tolerance: Tolerance;
}

/** Limits of the first bed. What is no matter of the rule (bedding, course height, grinding) is for the job to say. */
export interface FirstBedRule extends RuleOrigin {
  bed: Pick<BedRule, 'least' | 'most' | 'nominal'>;
}

const inches = (count: number): Nm => count * NM_PER_INCH;

const ACI_117: RuleSource = {
  title: 'ACI 117',
  edition: '117-90',
  place: '§3.3',
  seenIn: "a trade journal's answer; 117-06 and 117-10 alike from memory",
};
const TMS_602_BED: RuleSource = {
  title: 'TMS 602',
  edition: 'not named',
  place: 'first-course bed joint',
  seenIn: "a masonry contractors' association article",
};

/** Ready rules for the top of a footing. A job's engineer or inspector governs; none of these is advice. */
export const TOLERANCE_RULES: readonly ToleranceRule[] = [
  {
    id: 'aci-117-footing-under-masonry',
    surface: 'top',
    known: 'seen',
    source: ACI_117,
    tolerance: { low: inches(1 / 2), high: inches(1 / 2) },
  },
  {
    id: 'aci-117-other-footing',
    surface: 'top',
    known: 'seen',
    source: ACI_117,
    tolerance: { low: inches(2), high: inches(1 / 2) },
  },
  {
    id: 'tms-602-foundation-level',
    surface: 'top',
    known: 'seen',
    source: {
      title: 'TMS 602 / ACI 530.1',
      edition: 'not named',
      place: 'examination before masonry starts',
      seenIn: 'a city project specification',
    },
    tolerance: { low: inches(1 / 2), high: inches(1 / 2) },
  },
  {
    id: 'foam-forms',
    surface: 'top',
    known: 'common-practice',
    source: null,
    tolerance: { low: inches(1 / 4), high: inches(1 / 4) },
  },
];

/** Ready rules for the first bed of block. */
export const FIRST_BED_RULES: readonly FirstBedRule[] = [
  {
    id: 'tms-602-first-bed',
    known: 'seen',
    source: TMS_602_BED,
    bed: { least: inches(1 / 4), most: inches(3 / 4), nominal: inches(3 / 8) },
  },
  {
    id: 'tms-602-first-bed-fully-grouted',
    known: 'seen',
    source: TMS_602_BED,
    bed: { least: inches(1 / 4), most: inches(5 / 4), nominal: inches(3 / 8) },
  },
];

/** A user's own limits, beside the ready ones. @throws AnalysisError 'not-finite' | 'negative' | 'out-of-range' */
export function ownToleranceRule(id: string, tolerance: Tolerance): ToleranceRule {
  return {
    id,
    surface: 'top',
    known: 'own',
    source: null,
    tolerance: { low: lengthFromZero('tolerance.low', tolerance.low), high: lengthFromZero('tolerance.high', tolerance.high) },
  };
}

/** DIN 18202 Table 3: flatness by row, gap limits in mm at measuring distances. Row 5 is printed 20 and 25 at its end on one page. */
export const DIN_18202: {
  source: RuleSource;
  known: Knowledge;
  distances: readonly number[];
  rows: Readonly<Record<DinRow, readonly number[]>>;
} = {
  source: { title: 'DIN 18202', edition: 'not named', place: 'Table 3', seenIn: 'two tables that agree except as noted' },
  known: 'seen',
  distances: [0.1, 1, 4, 10, 15],
  rows: {
    1: [10, 15, 20, 25, 30],
    2: [5, 8, 12, 15, 20],
    3: [2, 4, 10, 12, 15],
    4: [1, 3, 9, 12, 15],
    5: [5, 10, 15, 25, 30],
    6: [3, 5, 10, 20, 25],
    7: [2, 3, 8, 15, 20],
  },
};

export type DinRow = 1 | 2 | 3 | 4 | 5 | 6 | 7;

/**
 * Largest gap that a row of DIN 18202 Table 3 allows over a measuring distance: linear between the table's distances, to a whole millimetre
 * (half up), and the 15 m value beyond. Raw footings are row 1, or 2 where specified.
 * @returns nm
 * @throws AnalysisError 'unknown-row' | 'distance-below-table' (under 0.1 m) | 'not-finite' | 'negative' | 'out-of-range'
 */
export function dinGapLimit(row: DinRow, distance: Nm): Nm {
  if (!Object.hasOwn(DIN_18202.rows, row))
    throw new AnalysisError('unknown-row', `DIN 18202 Table 3 has no row ${String(row)}.`, { row });
  const limits = DIN_18202.rows[row];
  const across = lengthFromZero('distance', distance) / NM_PER_METRE;
  const { distances } = DIN_18202;
  const next = distances.findIndex((tabulated) => across <= tabulated);
  if (next === -1) return (limits.at(-1) ?? 0) * NM_PER_MILLIMETRE;
  const [lower = 0, upper = 0] = [limits[next - 1] ?? limits[next], limits[next]];
  const from = distances[next - 1];
  const to = distances[next] ?? across;
  if (from === undefined) {
    if (across < to) throw new AnalysisError('distance-below-table', 'DIN 18202 says nothing under 0.1 m.', { distance });
    return upper * NM_PER_MILLIMETRE;
  }
  // A hair is added so that a half that rounding took under .5 still goes up.
  return Math.floor(lower + ((upper - lower) * (across - from)) / (to - from) + 0.5 + 1e-9) * NM_PER_MILLIMETRE;
}

/** Gap on a grid of three points in line: how far the middle lies from the mean of its neighbours; the measuring distance is first to third. */
export function dinGridGap(first: Nm, middle: Nm, third: Nm): Nm {
  return Math.abs((nanometres('first', first) + nanometres('third', third)) / 2 - nanometres('middle', middle));
}
