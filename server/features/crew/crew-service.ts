import { In } from 'typeorm';
import type { Me } from '@/shared/api/session-endpoints';
import type { Role } from '@/shared/roles';
import type { Tenant } from '../../api/handler';
import { Company, CrewPerson, Membership } from '../../entities/people';
import { NotFound, notPossible } from '../../errors';

export interface CrewMember {
  id: string;
  name: string;
  email: string;
  roles: Role[];
}

/** The people of the company, by name. Somebody without a role has left. */
export async function listCrew(tenant: Tenant): Promise<CrewMember[]> {
  const { manager, actor } = tenant;
  const memberships = (await manager.findBy(Membership, { companyId: actor.companyId })).filter(({ roles }) => roles.length > 0);
  const people = await manager.findBy(CrewPerson, { id: In(memberships.map((membership) => membership.personId)) });
  const members = memberships.flatMap(({ personId, roles }) => {
    const person = people.find(({ id }) => id === personId);
    return person === undefined ? [] : [{ id: person.id, name: person.name, email: person.email, roles }];
  });
  return members.sort((a, b) => a.name.localeCompare(b.name) || a.id.localeCompare(b.id));
}

/** Names of people of the company by id, those who have left among them. */
export async function namesOf(tenant: Tenant, ids: readonly string[]): Promise<Map<string, string>> {
  if (ids.length === 0) return new Map();
  const people = await tenant.manager.findBy(CrewPerson, { id: In([...new Set(ids)]) });
  return new Map(people.map(({ id, name }) => [id, name]));
}

export async function readMeInCompany(tenant: Tenant): Promise<Me> {
  const { manager, actor } = tenant;
  const person = await manager.findOneBy(CrewPerson, { id: actor.personId });
  const company = await manager.findOneBy(Company, { id: actor.companyId });
  if (person === null || company === null) throw new NotFound();
  return { person, company: { id: company.id, name: company.name }, roles: [...actor.roles] };
}

/** @throws NotFound; ApiError 'not-possible' when the company would be left without an owner */
export async function changeRoles(tenant: Tenant, personId: string, roles: readonly Role[]): Promise<CrewMember> {
  const { manager, actor } = tenant;
  // All of the company's, locked in one order: two owners cannot each take the other's place away at once.
  const memberships = await manager.find(Membership, {
    where: { companyId: actor.companyId },
    order: { personId: 'ASC' },
    lock: { mode: 'pessimistic_write' },
  });
  const changed = memberships.find((membership) => membership.personId === personId);
  const [person] = await manager.findBy(CrewPerson, { id: personId });
  if (changed === undefined || person === undefined) throw new NotFound();
  const otherOwner = memberships.some((membership) => membership !== changed && membership.roles.includes('owner'));
  if (!roles.includes('owner') && changed.roles.includes('owner') && !otherOwner) {
    throw notPossible('roles', 'last-owner', 'A company has an owner: make somebody else owner first.');
  }
  const unique = [...new Set(roles)];
  await manager.update(Membership, { companyId: actor.companyId, personId }, { roles: unique });
  return { id: person.id, name: person.name, email: person.email, roles: unique };
}
