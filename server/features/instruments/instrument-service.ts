import type { z } from 'zod';
import type { Laser, LaserInput, Rod, RodInput } from '@/shared/api/instrument-endpoints';
import type { endpoints } from '@/shared/api/endpoints';
import { isGraduationOf } from '@/shared/quantities';
import type { Tenant } from '../../api/handler';
import { sqlState, UNIQUE_VIOLATION } from '../../database/database';
import { LaserEntity, RodEntity, type LaserRow, type RodRow } from '../../entities/instruments';
import { nameTaken, NotFound, notPossible } from '../../errors';

type LaserChange = z.output<typeof endpoints.changeLaser.body>;
type RodChange = z.output<typeof endpoints.changeRod.body>;

function laserOf({ companyId: _company, createdAt: _created, ...laser }: LaserRow): Laser {
  return laser;
}

function rodOf({ companyId: _company, createdAt: _created, ...rod }: RodRow): Rod {
  return rod;
}

/** The company's lasers and rods, by name. */
export async function listInstruments({ manager, actor }: Tenant): Promise<{ lasers: Laser[]; rods: Rod[] }> {
  const where = { companyId: actor.companyId };
  const lasers = await manager.find(LaserEntity, { where, order: { name: 'ASC', id: 'ASC' } });
  const rods = await manager.find(RodEntity, { where, order: { name: 'ASC', id: 'ASC' } });
  return { lasers: lasers.map(laserOf), rods: rods.map(rodOf) };
}

/** @throws ApiError 'name-taken' */
export async function addLaser(tenant: Tenant, input: LaserInput): Promise<Laser> {
  const laser = { id: tenant.newId(), ...input };
  await orNameTaken(tenant.manager.insert(LaserEntity, { companyId: tenant.actor.companyId, createdAt: tenant.now(), ...laser }));
  return laser;
}

/** @throws NotFound; ApiError 'name-taken' */
export async function changeLaser(tenant: Tenant, id: string, change: LaserChange): Promise<Laser> {
  const key = { companyId: tenant.actor.companyId, id };
  if (!(await tenant.manager.existsBy(LaserEntity, key))) throw new NotFound();
  if (Object.keys(change).length > 0) await orNameTaken(tenant.manager.update(LaserEntity, key, change));
  return laserOf(await tenant.manager.findOneByOrFail(LaserEntity, key));
}

/** @throws ApiError 'name-taken', 'not-possible' */
export async function addRod(tenant: Tenant, input: RodInput): Promise<Rod> {
  refuseForeignMarks(input);
  const rod = { id: tenant.newId(), ...input };
  await orNameTaken(tenant.manager.insert(RodEntity, { companyId: tenant.actor.companyId, createdAt: tenant.now(), ...rod }));
  return rod;
}

/** @throws NotFound; ApiError 'name-taken', 'not-possible' */
export async function changeRod(tenant: Tenant, id: string, change: RodChange): Promise<Rod> {
  const key = { companyId: tenant.actor.companyId, id };
  const before = await tenant.manager.findOneBy(RodEntity, key);
  if (before === null) throw new NotFound();
  const rod = { ...rodOf(before), ...change };
  refuseForeignMarks(rod);
  if (Object.keys(change).length > 0) await orNameTaken(tenant.manager.update(RodEntity, key, change));
  return rod;
}

function refuseForeignMarks({ style, graduation }: Pick<Rod, 'style' | 'graduation'>): void {
  if (!isGraduationOf(style, graduation)) {
    throw notPossible('graduation', 'graduation-not-of-style', 'A rod of this style has no such marks.', { style, graduation });
  }
}

async function orNameTaken(write: Promise<unknown>): Promise<void> {
  try {
    await write;
  } catch (error) {
    throw sqlState(error) === UNIQUE_VIOLATION ? nameTaken('name') : error;
  }
}
