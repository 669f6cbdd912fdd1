import * as fc from 'fast-check';
import { AnalysisError } from '@/analysis/analysis-error';
import { fitPlane } from '@/analysis/plane-fit';
import { fitPlaneHuber } from '@/analysis/plane-fit-huber';
import { fitPlaneMinimumZone } from '@/analysis/plane-fit-minimum-zone';
import type { PlaneFit, PlanePoint } from '@/analysis/types';

const within = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true, noDefaultInfinity: true });
const eighths = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: 8 * min, max: 8 * max }).map((value) => value / 8);

/** Rounds of 6 to 20 stations on an eighth-of-a-foot grid that carry a plane, read to a sixteenth of an inch of a foot, some weighted. */
const round: fc.Arbitrary<PlanePoint[]> = fc
  .array(
    fc.record({
      x: eighths(-60, 60),
      y: eighths(-40, 40),
      z: eighths(-2, 2).map((z) => z / 96),
      weight: fc.option(fc.integer({ min: 1, max: 8 }), { nil: undefined }),
    }),
    { minLength: 6, maxLength: 20 },
  )
  .map((points) =>
    points.map(({ weight, ...point }, i) => ({ id: `${i}`, ...point, ...(weight === undefined ? {} : { weight }) })),
  )
  .filter((points) => {
    const fit = fitPlane(points);
    return fit.model === 'plane' && (fit.residualStandardError ?? 0) > 1e-6;
  });

/** Each |a − b| against the size that rounding is measured by. */
function close(a: number | null | undefined, b: number | null | undefined, size: number, digits = 1e-10): void {
  if (a == null || b == null) expect(a).toBe(b);
  else expect(Math.abs(a - b)).toBeLessThanOrEqual(digits * Math.max(size, Math.abs(b)));
}

/** What neither a shift nor a turn of the plan may change. */
function samePoints(before: PlaneFit, after: PlaneFit, lift = 0): void {
  close(after.residualStandardError, before.residualStandardError, 1);
  close(after.rSquared, before.rSquared, 1);
  close(after.fTest?.p, before.fTest?.p, 1, 1e-9);
  close(after.tilt.slope, before.tilt.slope, 1e-3);
  close(after.tilt.slopeStandardError, before.tilt.slopeStandardError, 1e-3, 1e-8);
  close(after.tilt.drop, before.tilt.drop, 1);
  before.points.forEach((point, i) => {
    const moved = after.points[i];
    close(moved?.residual, point.residual, 1);
    close(moved?.fitted, point.fitted + lift, 1);
    close(moved?.leverage, point.leverage, 1);
    close(moved?.studentized, point.studentized, 1, 1e-8);
    close(moved?.cooks, point.cooks, 1, 1e-7);
  });
}

describe('fitPlane moves as theory says', () => {
  it('with a shift of the plan: only the constant changes, by the slopes', () => {
    fc.assert(
      fc.property(
        round,
        fc.integer({ min: -1_000_000, max: 1_000_000 }),
        fc.integer({ min: -1_000_000, max: 1_000_000 }),
        (points, east, north) => {
          const before = fitPlane(points);
          const after = fitPlane(points.map((point) => ({ ...point, x: point.x + east, y: point.y + north })));
          samePoints(before, after);
          const [b, c] = [before.b?.value ?? NaN, before.c?.value ?? NaN];
          close(after.b?.value, b, 1e-3);
          close(after.c?.value, c, 1e-3);
          close(after.a.value, before.a.value - b * east - c * north, 1e-3 * (1 + Math.abs(east) + Math.abs(north)));
          expect(after.shares).toEqual({
            offset: expect.closeTo(before.shares.offset, 9),
            tilt: expect.closeTo(before.shares.tilt, 9),
            rest: expect.closeTo(before.shares.rest, 9),
          });
        },
      ),
    );
  });

  it('with a turn of the plan: the fall turns with it', () => {
    fc.assert(
      fc.property(round, within(0, 360), (points, degrees) => {
        const angle = (degrees * Math.PI) / 180;
        const before = fitPlane(points);
        const after = fitPlane(
          points.map((point) => ({
            ...point,
            x: point.x * Math.cos(angle) + point.y * Math.sin(angle),
            y: point.y * Math.cos(angle) - point.x * Math.sin(angle),
          })),
        );
        samePoints(before, after);
        if (before.tilt.slope > 1e-6) {
          const turned = ((after.tilt.fallAzimuth ?? NaN) - (before.tilt.fallAzimuth ?? NaN) - degrees + 720) % 360;
          expect(Math.min(turned, 360 - turned)).toBeLessThan(1e-5);
        }
      }),
    );
  });

  it('with a scale of the plan or of the elevations: slopes by their ratio, residuals by the elevations', () => {
    fc.assert(
      fc.property(round, within(1e-3, 1e9), within(1e-3, 1e9), (points, plan, rise) => {
        const before = fitPlane(points);
        const after = fitPlane(points.map((point) => ({ ...point, x: plan * point.x, y: plan * point.y, z: rise * point.z })));
        close(after.tilt.slope, (before.tilt.slope * rise) / plan, (1e-3 * rise) / plan);
        close(after.residualStandardError, (before.residualStandardError ?? NaN) * rise, rise);
        close(after.rSquared, before.rSquared, 1);
        before.points.forEach((point, i) => close(after.points[i]?.deletedStudentized, point.deletedStudentized, 1, 1e-7));
      }),
    );
  });

  it('with a plane added to the elevations: slopes by that plane, residuals not at all', () => {
    fc.assert(
      fc.property(round, within(-0.1, 0.1), within(-0.1, 0.1), within(-10, 10), (points, b, c, a) => {
        const before = fitPlane(points);
        const after = fitPlane(points.map((point) => ({ ...point, z: point.z + a + b * point.x + c * point.y })));
        close(after.b?.value, (before.b?.value ?? NaN) + b, 1);
        close(after.c?.value, (before.c?.value ?? NaN) + c, 1);
        close(after.a.value, before.a.value + a, 10);
        before.points.forEach((point, i) => close(after.points[i]?.residual, point.residual, 10));
      }),
    );
  });

  it('with the order of the points: not at all', () => {
    fc.assert(
      fc.property(round, fc.nat(20), (points, turn) => {
        const order = [...points.slice(turn % points.length), ...points.slice(0, turn % points.length)].reverse();
        const [before, after] = [fitPlane(points), fitPlane(order)];
        samePoints(before, {
          ...after,
          points: points.map(({ id }) => after.points.find((point) => point.id === id)).flatMap((point) => point ?? []),
        });
      }),
    );
  });

  it('with a whole weight: as if the shot had been taken so many times, but for the degrees of freedom', () => {
    fc.assert(
      fc.property(round, (points) => {
        const repeated = points.flatMap(({ weight = 1, ...point }) =>
          Array.from({ length: weight }, (_, i) => ({ ...point, id: `${point.id}.${i}` })),
        );
        const [once, often] = [fitPlane(points), fitPlane(repeated)];
        close(often.b?.value, once.b?.value, 1e-3);
        close(often.c?.value, once.c?.value, 1e-3);
        close(often.a.value, once.a.value, 1e-2);
        close(often.rSquared, once.rSquared, 1);
        close((often.residualStandardError ?? NaN) ** 2 * often.df, (once.residualStandardError ?? NaN) ** 2 * once.df, 1);
      }),
    );
  });
});

describe('fitPlane keeps its own laws', () => {
  it('shares sum to 1, leverages to the number of coefficients, weighted residuals to 0 along every direction', () => {
    fc.assert(
      fc.property(round, (points) => {
        const fit = fitPlane(points);
        expect(fit.shares.offset + fit.shares.tilt + fit.shares.rest).toBeCloseTo(1, 12);
        expect(fit.points.reduce((sum, { leverage }) => sum + leverage, 0)).toBeCloseTo(3, 9);
        for (const along of [() => 1, (point: PlanePoint) => point.x, (point: PlanePoint) => point.y]) {
          const sum = points.reduce(
            (total, point, i) => total + (point.weight ?? 1) * along(point) * (fit.points[i]?.residual ?? NaN),
            0,
          );
          expect(Math.abs(sum)).toBeLessThan(1e-9);
        }
        fit.points.forEach((point, i) => expect(point.fitted + point.residual).toBeCloseTo(points[i]?.z ?? NaN, 12));
      }),
    );
  });

  it('the external residual of a shot is its distance from the plane of the others, in standard errors', () => {
    fc.assert(
      fc.property(round, fc.nat(5), (points, at) => {
        const fit = fitPlane(points);
        const others = fitPlane(points.filter((_, i) => i !== at));
        const point = points[at];
        const own = fit.points[at];
        fc.pre(
          point !== undefined &&
            own !== undefined &&
            others.model === 'plane' &&
            own.deletedStudentized !== null &&
            (others.residualStandardError ?? 0) > 1e-9,
        );
        const expected =
          (others.a.value ?? NaN) + (others.b?.value ?? NaN) * (point?.x ?? NaN) + (others.c?.value ?? NaN) * (point?.y ?? NaN);
        const left = 1 - (own?.leverage ?? NaN);
        const t =
          (((point?.z ?? NaN) - expected) * Math.sqrt(left * (point?.weight ?? 1))) / (others.residualStandardError ?? NaN);
        close(own?.deletedStudentized, t, 1, 1e-6);
      }),
    );
  });

  it('gives finite numbers and nulls, or an AnalysisError, on any input', () => {
    const any = fc.record({
      id: fc.string({ maxLength: 3 }),
      x: fc.double(),
      y: fc.double(),
      z: fc.double(),
      weight: fc.option(fc.double(), { nil: undefined }),
    });
    const tame = fc.record({
      id: fc.string({ maxLength: 3 }),
      x: within(-1e59, 1e59),
      y: within(-1e-59, 1e-59),
      z: within(-1e59, 1e59),
      weight: fc.option(within(1e-59, 1e59), { nil: undefined }),
    });
    const small = fc.record({
      id: fc.string({ maxLength: 3 }),
      x: fc.integer({ min: 0, max: 2 }),
      y: fc.integer({ min: 0, max: 2 }),
      z: fc.integer({ min: 0, max: 2 }),
    });
    const points = fc.oneof(
      fc.array(any, { maxLength: 8 }),
      fc.array(tame, { maxLength: 8 }),
      fc.array(small, { maxLength: 12 }),
    );
    const numbersIn = (value: unknown): unknown[] =>
      typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersIn) : [value];
    fc.assert(
      fc.property(points, (given) => {
        for (const fit of [fitPlane, fitPlaneHuber, fitPlaneMinimumZone]) {
          try {
            for (const value of numbersIn(fit(given))) if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
          } catch (error) {
            expect(error).toBeInstanceOf(AnalysisError);
          }
        }
      }),
      { numRuns: 1000 },
    );
  });
});
