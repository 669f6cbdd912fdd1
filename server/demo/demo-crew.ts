import type { Role } from '@/shared/roles';
import type { Tenant } from '../api/handler';
import type { Transactions } from '../database/database';
import { newId } from '../dependencies';
import { Membership } from '../entities/people';
import { hashPassphrase } from '../features/session/passphrase';
import { addPerson, SALT_BYTES, signUp } from '../features/session/session-service';
import type { DemoSources } from './demo-sources';

export const COMPANY = 'Fallow Creek Footings';

/** All invented, with addresses that no mail reaches. Whoever signs the company up has all four roles; that is the owner here. */
const PEOPLE = [
  { role: 'owner', name: 'Ines Tarrow', email: 'ines@example.test', password: 'two herons over wet sand' },
  { role: 'super', name: 'Dov Hallam', email: 'dov@example.test', password: 'blue ladder, eleven rungs' },
  { role: 'operator', name: 'Petra Quill', email: 'petra@example.test', password: 'kettle on before the frost' },
  { role: 'installer', name: 'Owen Sabe', email: 'owen@example.test', password: 'mortar hawk and a red plum' },
] as const satisfies readonly { role: Role; name: string; email: string; password: string }[];

export type DemoRole = (typeof PEOPLE)[number]['role'];

export interface DemoCrew {
  /** Works as one of the people, in a transaction of the company. */
  as<T>(role: DemoRole, work: (tenant: Tenant) => Promise<T>): Promise<T>;
  /** name · role · email · password */
  signIns: string[];
}

/** Signs the company up and gives it its people. */
export async function hireCrew(database: Transactions, sources: DemoSources): Promise<DemoCrew> {
  // The demo's own sign-ins are never used: the secret that signs them is the demo's too.
  const config = {
    appUrl: new URL('http://localhost'),
    jwtSecret: 'the demo signs nobody in for good',
    webDir: null,
    trustProxy: null,
  };
  const [owner, ...others] = PEOPLE;
  const { session } = await signUp({ config, database, sources }, { company: COMPANY, ...owner });
  const companyId = session.me.company.id;
  const ids = new Map<DemoRole, string>([[owner.role, session.me.person.id]]);
  for (const { role, name, email, password } of others) {
    const id = newId(sources);
    const hash = await hashPassphrase(password, sources.randomBytes(SALT_BYTES));
    await database.asIdentity(async (manager) => {
      await addPerson(manager, { sources }, { id, name, email, hash });
      await manager.insert(Membership, { companyId, personId: id, roles: [role], createdAt: sources.now() });
    });
    ids.set(role, id);
  }
  const rolesOf = (role: DemoRole): Role[] => (role === 'owner' ? ['owner', 'super', 'operator', 'installer'] : [role]);
  return {
    as: (role, work) =>
      database.asCompany(companyId, (manager) => {
        const actor = { companyId, personId: ids.get(role) ?? session.me.person.id, roles: rolesOf(role) };
        return work({ actor, manager, now: () => sources.now(), newId: () => newId(sources) });
      }),
    signIns: PEOPLE.map(({ name, role, email, password }) => `${name} · ${role} · ${email} · ${password}`),
  };
}
