import { addLaser, addRod } from '../features/instruments/instrument-service';
import type { DemoCrew } from './demo-crew';
import { FOOT, HUNDREDTH, INCH, METRE, MM } from './demo-lengths';
import type { DemoRod } from './demo-phone';

export interface DemoInstruments {
  /** Stated to 1/16 in at 100 ft. */
  good: string;
  /** Stated to 1/8 in at 100 ft, and out of level by more: the demo's crew set one footing with it. */
  loaner: string;
  /** Read on the job to its finest mark. */
  inches: DemoRod;
  feet: DemoRod;
  metric: DemoRod;
}

export function buyInstruments(crew: DemoCrew): Promise<DemoInstruments> {
  return crew.as('super', async (tenant) => {
    const good = await addLaser(tenant, {
      name: 'Laser 1, green case',
      accuracy: INCH / 16,
      accuracyAt: 100 * FOOT,
      receiverFine: INCH / 16,
      receiverCoarse: INCH / 8,
      checkedOn: '2026-11-02',
    });
    const loaner = await addLaser(tenant, {
      name: 'Laser 2, loaner',
      accuracy: INCH / 8,
      accuracyAt: 100 * FOOT,
      receiverFine: INCH / 8,
      receiverCoarse: INCH / 4,
      checkedOn: null,
    });
    const inches = await addRod(tenant, {
      name: '13 ft, eighths',
      style: 'feet-inches',
      graduation: INCH / 8,
      length: 13 * FOOT,
    });
    const feet = await addRod(tenant, {
      name: '16 ft, hundredths',
      style: 'decimal-feet',
      graduation: HUNDREDTH,
      length: 16 * FOOT,
    });
    const metric = await addRod(tenant, { name: '4 m, millimetres', style: 'metric', graduation: MM, length: 4 * METRE });
    return {
      good: good.id,
      loaner: loaner.id,
      // Marked to eighths, read to sixteenths.
      inches: { id: inches.id, style: 'feet-inches', graduation: INCH / 16 },
      feet: { id: feet.id, style: 'decimal-feet', graduation: HUNDREDTH },
      metric: { id: metric.id, style: 'metric', graduation: MM },
    };
  });
}
