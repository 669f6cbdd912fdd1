import { studentUpperQuantile } from '@/analysis/distributions';
import { fitPlane } from '@/analysis/plane-fit';
import { fitPlaneHuber } from '@/analysis/plane-fit-huber';
import { fitPlaneMinimumZone } from '@/analysis/plane-fit-minimum-zone';
import { screenShots } from '@/analysis/screening';
import { tiltAgainstLaser } from '@/analysis/tilt-against-laser';
import { shotUncertainty } from '@/analysis/uncertainty';
import { FOOT, INCH, U, walk } from '../support/rounds';

/** The pad of docs/maths-plane.md; every number below is worked there by hand. */
const pad = [
  { id: 'A', x: 0, y: 0, z: 1 },
  { id: 'B', x: 40, y: 0, z: 5 },
  { id: 'C', x: 40, y: 20, z: 2 },
  { id: 'D', x: 0, y: 20, z: 0 },
];

describe('the worked pages on tilt, suspects and uncertainty', () => {
  it('fit the pad as on paper', () => {
    const fit = fitPlane(pad);
    expect(fit.b?.value).toBeCloseTo(0.075, 12);
    expect(fit.c?.value).toBeCloseTo(-0.1, 12);
    [1.5, 4.5, 2.5, -0.5].forEach((fitted, i) => expect(fit.points[i]?.fitted).toBeCloseTo(fitted, 12));
    [-0.5, 0.5, -0.5, 0.5].forEach((residual, i) => expect(fit.points[i]?.residual).toBeCloseTo(residual, 12));
    expect(fit.tilt.slope).toBeCloseTo(0.125, 12);
    expect(fit.tilt.fallAzimuth).toBeCloseTo(323.13, 2);
    expect(fit.tilt.drop).toBeCloseTo(5, 12);
    expect(fit.residualStandardError).toBeCloseTo(1, 12);
    expect(fit.b?.standardError).toBeCloseTo(0.025, 12);
    expect(fit.b?.t).toBeCloseTo(3, 10);
    expect(fit.b?.p).toBeCloseTo(0.205, 3);
    expect(fit.fTest?.f).toBeCloseTo(6.5, 10);
    expect(fit.fTest?.p).toBeCloseTo(0.267, 3);
    expect(fit.shares.offset).toBeCloseTo(16 / 30, 12);
    expect(fit.shares.tilt).toBeCloseTo(13 / 30, 12);
    expect(fit.shares.rest).toBeCloseTo(1 / 30, 12);
    expect(fit.points[0]?.leverage).toBeCloseTo(0.75, 12);
    expect(fit.points[0]?.studentized).toBeCloseTo(-1, 10);
    expect(fit.points[0]?.deletedStudentized).toBeNull();
    expect(fit.points[0]?.cooks).toBeCloseTo(1, 10);
  });

  it('hold the pad against the laser as on paper', () => {
    const fit = fitPlane(pad);
    expect(fit.tilt.slopeStandardError).toBeCloseTo(0.0427, 4);
    expect(tiltAgainstLaser(fit, { accuracy: 1, at: 100 })).toEqual({
      beyondReading: false,
      beyondLaser: true,
      laserSlope: 0.01,
    });
  });

  it('lay the thinnest slab on the pad as on paper', () => {
    const zone = fitPlaneMinimumZone(pad);
    expect(zone.halfWidth).toBeCloseTo(0.5, 12);
    expect(zone.support).toEqual(['A', 'B', 'C', 'D']);
  });

  it('settle the five readings where one more step changes nothing', () => {
    const { a, scale, weights } = fitPlaneHuber([0, 1, 2, 3, 20].map((z, i) => ({ id: `${i}`, x: 7, y: 7, z })));
    expect(a).toBeCloseTo(2, 10);
    expect(scale).toBeCloseTo(1.4826, 4);
    expect(weights.map((weight) => weight.toFixed(4))).toEqual(['0.9970', '1.0000', '1.0000', '1.0000', '0.1108']);
  });

  it('name the half-inch as on paper', () => {
    expect(studentUpperQuantile(0.05 / 48, 20)).toBeCloseTo(3.534, 3);
    const shots = walk(24, 'rectangle').map((place, i) => ({ id: `S${i}`, ...place, deviation: i === 3 ? INCH / 2 : 0 }));
    const [suspect] = screenShots(shots, { closed: true, u: U });
    expect(suspect).toMatchObject({ id: 'S3', explanation: 'half-inch' });
    expect(suspect?.size).toBeCloseTo(INCH / 2, 0);
  });

  it('add the parts of one shot as on paper', () => {
    const parts = shotUncertainty({
      graduation: INCH / 16,
      laserAccuracy: INCH / 16,
      laserAccuracyAt: 100 * FOOT,
      distance: 50 * FOOT,
      benchmarkDistance: 100 * FOOT,
    });
    const inches = Object.fromEntries(Object.entries(parts).map(([name, nm]) => [name, (nm / INCH).toFixed(4)]));
    expect(inches).toEqual({ reading: '0.0180', laser: '0.0180', backsight: '0.0403', absolute: '0.0477', relative: '0.0180' });
  });
});
