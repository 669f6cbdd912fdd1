import { EntitySchema } from 'typeorm';
import type { UnitStyle } from '@/shared/quantities';
import { big, companyId, id, text, time, uuid } from './columns';

/** `checkedOn`: a day as YYYY-MM-DD. */
export interface LaserRow {
  companyId: string;
  id: string;
  name: string;
  accuracy: number;
  accuracyAt: number;
  receiverFine: number;
  receiverCoarse: number;
  checkedOn: string | null;
  createdAt: Date;
}
export const LaserEntity = new EntitySchema<LaserRow>({
  name: 'Laser',
  tableName: 'lasers',
  columns: {
    companyId,
    id,
    name: text,
    accuracy: big,
    accuracyAt: big,
    receiverFine: big,
    receiverCoarse: big,
    checkedOn: { type: 'date', nullable: true },
    createdAt: time,
  },
});

export interface RodRow {
  companyId: string;
  id: string;
  name: string;
  style: UnitStyle;
  graduation: number;
  length: number;
  createdAt: Date;
}
export const RodEntity = new EntitySchema<RodRow>({
  name: 'Rod',
  tableName: 'rods',
  columns: { companyId, id, name: text, style: text, graduation: big, length: big, createdAt: time },
});

/** A browser that records are made on. */
export interface DeviceRow {
  companyId: string;
  id: string;
  firstSeenAt: Date;
  firstPersonId: string;
}
export const Device = new EntitySchema<DeviceRow>({
  name: 'Device',
  tableName: 'devices',
  columns: { companyId, id, firstSeenAt: time, firstPersonId: uuid },
});
