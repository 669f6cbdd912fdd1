import { stationName } from '@/shared/station-name';

const FOOT = 304_800_000;

// Stationing by hundreds of feet is common practice of surveying; the tenth and the centimetre are the product's own choice.
describe('stationName', () => {
  it.each([
    [0, '0+00'],
    [74, '0+74'],
    [100, '1+00'],
    [107.3, '1+07.3'],
    [22 / 3, '0+07.3'],
    [44 / 3, '0+14.7'],
    [99.96, '1+00'],
    [3280, '32+80'],
  ])('%s ft is %s, whatever the marks of the job', (feet, name) => {
    expect(stationName(Math.round(feet * FOOT), 'feet-inches')).toBe(name);
    expect(stationName(Math.round(feet * FOOT), 'decimal-feet')).toBe(name);
  });

  it.each([
    [0, '0 m'],
    [22_550_000_000, '22.55 m'],
    [7_500_000_000, '7.5 m'],
    [1_999_999_999, '2 m'],
    [3_050_000_000, '3.05 m'],
  ])('%s nm is %s', (at, name) => {
    expect(stationName(at, 'metric')).toBe(name);
  });
});
