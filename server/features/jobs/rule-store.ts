import { In } from 'typeorm';
import {
  SURFACES,
  type BedRule,
  type BedRuleInput,
  type Surface,
  type ToleranceRule,
  type ToleranceRuleInput,
} from '@/shared/rules';
import type { Tenant } from '../../api/handler';
import {
  BedRule as BedRuleEntity,
  ToleranceRule as ToleranceRuleEntity,
  type BedRuleRow,
  type ToleranceRuleRow,
} from '../../entities/jobs';

export interface RulesInForce {
  tolerance: ToleranceRule[];
  bed: BedRule;
}

export function toleranceRuleOf(row: ToleranceRuleRow): ToleranceRule {
  const { id, surface, version, low, high, decision, style } = row;
  return { id, surface, version, low, high, decision, style, createdAt: row.createdAt.toISOString() };
}

export function bedRuleOf(row: BedRuleRow): BedRule {
  const { id, version, material, least, most, nominal, grindMost, beddedFraction, courseHeight, style } = row;
  const rule = { id, version, material, least, most, nominal, grindMost, beddedFraction, courseHeight, style };
  return { ...rule, createdAt: row.createdAt.toISOString() };
}

/** The newest version of each rule of a job, surfaces in their order. */
export async function rulesInForce({ manager, actor }: Tenant, jobId: string): Promise<RulesInForce> {
  const where = { companyId: actor.companyId, jobId };
  const tolerances = await manager.find(ToleranceRuleEntity, { where, order: { version: 'DESC' } });
  const bed = await manager.findOneOrFail(BedRuleEntity, { where, order: { version: 'DESC' } });
  const tolerance = SURFACES.flatMap((surface) => {
    const row = tolerances.find((rule) => rule.surface === surface);
    return row === undefined ? [] : [toleranceRuleOf(row)];
  });
  return { tolerance, bed: bedRuleOf(bed) };
}

/** The very versions that rounds were opened under, by id. */
export async function rulesById(
  { manager, actor }: Tenant,
  toleranceIds: readonly string[],
  bedIds: readonly string[],
): Promise<{ tolerance: Map<string, ToleranceRule>; bed: Map<string, BedRule> }> {
  const { companyId } = actor;
  const tolerances =
    toleranceIds.length === 0 ? [] : await manager.findBy(ToleranceRuleEntity, { companyId, id: In([...new Set(toleranceIds)]) });
  const beds = bedIds.length === 0 ? [] : await manager.findBy(BedRuleEntity, { companyId, id: In([...new Set(bedIds)]) });
  return {
    tolerance: new Map(tolerances.map((row) => [row.id, toleranceRuleOf(row)])),
    bed: new Map(beds.map((row) => [row.id, bedRuleOf(row)])),
  };
}

/** Adds the next version; `after` is the one in force, 0 for none. */
export async function addToleranceRule(
  tenant: Tenant,
  at: { jobId: string; surface: Surface; after: number },
  input: ToleranceRuleInput,
): Promise<ToleranceRule> {
  const row = { ...ownFields(tenant), jobId: at.jobId, surface: at.surface, version: at.after + 1, ...input };
  await tenant.manager.insert(ToleranceRuleEntity, row);
  return toleranceRuleOf(row);
}

export async function addBedRule(tenant: Tenant, at: { jobId: string; after: number }, input: BedRuleInput): Promise<BedRule> {
  const row = { ...ownFields(tenant), jobId: at.jobId, version: at.after + 1, ...input };
  await tenant.manager.insert(BedRuleEntity, row);
  return bedRuleOf(row);
}

function ownFields(tenant: Tenant) {
  const { companyId, personId } = tenant.actor;
  return { companyId, id: tenant.newId(), createdAt: tenant.now(), createdBy: personId };
}
