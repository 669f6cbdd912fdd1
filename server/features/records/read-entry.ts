import { z } from 'zod';
import { idSchema } from '@/shared/quantities';
import { recordSchema, type FieldRecord } from '@/shared/records';
import { contentHash } from './content-hash';
import type { DevicePlace } from './device-timeline';

/** A record as it came: read, or, where it cannot be, as far as it says where in its phone's order it stands. */
export interface Entry {
  /** As the phone wrote it, for the answer. */
  sentId: string;
  id: string;
  content: object;
  hash: string;
  record: FieldRecord | null;
  place: (DevicePlace & { wall: number }) | null;
}

/** One that cannot be read says when it was made where it can; where it cannot, it counts as made with the one before it. */
const placeSchema = z.object({
  deviceId: idSchema,
  deviceSequence: z.int().positive(),
  clock: z.object({ wall: z.int().min(0) }).catch({ wall: 0 }),
});

export function readEntry(sent: { id: string }): Entry {
  const content = withSmallIds(sent);
  const id = sent.id.toLowerCase();
  const read = recordSchema.safeParse(content);
  if (read.success && !hasNul(read.data)) {
    const record = { ...read.data, madeAt: new Date(read.data.madeAt).toISOString() };
    const { deviceId, deviceSequence, clock } = record;
    return {
      sentId: sent.id,
      id,
      content,
      hash: contentHash(record),
      record,
      place: { deviceId, deviceSequence, wall: clock.wall },
    };
  }
  const placed = placeSchema.safeParse(content);
  const place = placed.success
    ? { deviceId: placed.data.deviceId, deviceSequence: placed.data.deviceSequence, wall: placed.data.clock.wall }
    : null;
  return { sentId: sent.id, id, content, hash: contentHash(content), record: null, place };
}

/** A UUID is one thing in capitals and in small letters; the database writes small ones. */
function withSmallIds(value: object): object {
  return Object.fromEntries(
    Object.entries(value).map(([key, part]: [string, unknown]) => {
      if (typeof part === 'string' && /(^i|I)d$/.test(key)) return [key, part.toLowerCase()];
      if (typeof part === 'object' && part !== null && !Array.isArray(part)) return [key, withSmallIds(part)];
      return [key, part];
    }),
  );
}

/** PostgreSQL keeps any text but one with this character. */
function hasNul(value: unknown): boolean {
  return JSON.stringify(value).includes('\\u0000');
}
