import { z } from 'zod';
import { idSchema, nameSchema, positiveNmSchema, unitStyleSchema } from '../quantities';
import { endpoint } from './endpoint';

const laserFields = {
  name: nameSchema,
  /** Stated accuracy: `accuracy` at `accuracyAt`, e.g. 1/16 in at 100 ft. */
  accuracy: positiveNmSchema,
  accuracyAt: positiveNmSchema,
  /** The receiver's on-grade band, whole width, in its fine and coarse setting. */
  receiverFine: positiveNmSchema,
  receiverCoarse: positiveNmSchema,
  /** Last field check; null when none is known. */
  checkedOn: z.iso.date().nullable(),
};
export const laserInputSchema = z.strictObject(laserFields);
export const laserSchema = z.strictObject({ id: idSchema, ...laserFields });
export type Laser = z.infer<typeof laserSchema>;
export type LaserInput = z.infer<typeof laserInputSchema>;

const rodFields = { name: nameSchema, style: unitStyleSchema, graduation: positiveNmSchema, length: positiveNmSchema };
export const rodInputSchema = z.strictObject(rodFields);
export const rodSchema = z.strictObject({ id: idSchema, ...rodFields });
export type Rod = z.infer<typeof rodSchema>;
export type RodInput = z.infer<typeof rodInputSchema>;

const laserId = z.strictObject({ laserId: idSchema });
const rodId = z.strictObject({ rodId: idSchema });

export const instrumentEndpoints = {
  instruments: endpoint({
    method: 'GET',
    path: '/api/instruments',
    summary: 'The company’s lasers and rods.',
    access: 'signed-in',
    status: 200,
    params: null,
    query: null,
    body: null,
    response: z.strictObject({ lasers: z.array(laserSchema), rods: z.array(rodSchema) }),
  }),
  addLaser: endpoint({
    method: 'POST',
    path: '/api/lasers',
    summary: 'Enter a laser in the register.',
    access: { may: 'laser.write' },
    status: 201,
    params: null,
    query: null,
    body: laserInputSchema,
    response: laserSchema,
  }),
  changeLaser: endpoint({
    method: 'PATCH',
    path: '/api/lasers/:laserId',
    summary: 'Correct a laser; absent keeps.',
    access: { may: 'laser.write' },
    status: 200,
    params: laserId,
    query: null,
    body: laserInputSchema.partial(),
    response: laserSchema,
  }),
  addRod: endpoint({
    method: 'POST',
    path: '/api/rods',
    summary: 'Enter a rod.',
    access: { may: 'laser.write' },
    status: 201,
    params: null,
    query: null,
    body: rodInputSchema,
    response: rodSchema,
  }),
  changeRod: endpoint({
    method: 'PATCH',
    path: '/api/rods/:rodId',
    summary: 'Correct a rod; absent keeps.',
    access: { may: 'laser.write' },
    status: 200,
    params: rodId,
    query: null,
    body: rodInputSchema.partial(),
    response: rodSchema,
  }),
};
