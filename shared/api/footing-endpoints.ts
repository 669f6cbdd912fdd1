import { z } from 'zod';
import { idSchema, nameSchema, notNegativeNmSchema, positiveNmSchema } from '../quantities';
import { endpoint } from './endpoint';
import { footingFields, footingSchema, outlineInputSchema } from './footing-schemas';

const footingId = z.strictObject({ footingId: idSchema });
const stationId = z.strictObject({ stationId: idSchema });
const FOOT = 304_800_000;

export const footingEndpoints = {
  addFooting: endpoint({
    method: 'POST',
    path: '/api/jobs/:jobId/footings',
    summary: 'A new footing of a job.',
    access: { may: 'footing.write' },
    status: 201,
    params: z.strictObject({ jobId: idSchema }),
    query: null,
    body: z.strictObject(footingFields),
    response: footingSchema,
  }),
  footing: endpoint({
    method: 'GET',
    path: '/api/footings/:footingId',
    summary: 'One footing: outline, stations, rounds, stages.',
    access: 'signed-in',
    status: 200,
    params: footingId,
    query: null,
    body: null,
    response: footingSchema,
  }),
  changeFooting: endpoint({
    method: 'PATCH',
    path: '/api/footings/:footingId',
    summary: 'Change a footing; absent keeps, a null landmark clears.',
    access: { may: 'footing.write' },
    status: 200,
    params: footingId,
    query: null,
    body: z.strictObject(footingFields).partial(),
    response: footingSchema,
  }),
  setOutline: endpoint({
    method: 'PUT',
    path: '/api/footings/:footingId/outline',
    summary: 'The runs in walking order, all at once. Stations no longer on it go; once shot, only a super may.',
    access: { may: 'outline.change' },
    status: 200,
    params: footingId,
    query: null,
    body: outlineInputSchema,
    response: footingSchema,
  }),
  setStations: endpoint({
    method: 'PUT',
    path: '/api/footings/:footingId/stations',
    summary: 'Lay stations out: every corner, both sides of every step, and between them no further apart than the spacing.',
    access: { may: 'station.write' },
    status: 200,
    params: footingId,
    query: null,
    body: z.strictObject({ spacing: positiveNmSchema.min(FOOT).max(100 * FOOT) }),
    response: footingSchema,
  }),
  addStation: endpoint({
    method: 'POST',
    path: '/api/footings/:footingId/stations',
    summary: 'One more station, at a distance along the walk.',
    access: { may: 'station.write' },
    status: 201,
    params: footingId,
    query: null,
    body: z.strictObject({ at: notNegativeNmSchema }),
    response: footingSchema,
  }),
  changeStation: endpoint({
    method: 'PATCH',
    path: '/api/stations/:stationId',
    summary: 'Name a station, or move it while nothing is shot there.',
    access: { may: 'station.write' },
    status: 200,
    params: stationId,
    query: null,
    body: z.strictObject({ name: nameSchema, at: notNegativeNmSchema }).partial(),
    response: footingSchema,
  }),
  removeStation: endpoint({
    method: 'DELETE',
    path: '/api/stations/:stationId',
    summary: 'Remove a station while nothing is shot there.',
    access: { may: 'station.write' },
    status: 200,
    params: stationId,
    query: null,
    body: null,
    response: footingSchema,
  }),
};
