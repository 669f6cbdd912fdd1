import { createHash } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import {
  Company,
  Credential,
  Membership,
  Person,
  RefreshToken,
  SignInSession,
  type MembershipRow,
  type PersonRow,
  type RefreshTokenRow,
  type SessionRow,
} from '../../entities/people';
import type { Me } from '@/shared/api/session-endpoints';

/** Reads and writes of who signs in, all in a transaction of the identity role. */

export interface KnownPerson {
  person: PersonRow;
  hash: string;
}

/** E-mail addresses are compared without case. */
export function sameEmail(email: string): string {
  return email.trim().toLowerCase();
}

export async function findPerson(manager: EntityManager, email: string): Promise<KnownPerson | null> {
  const person = await manager.findOneBy(Person, { email: sameEmail(email) });
  if (person === null) return null;
  const credential = await manager.findOneBy(Credential, { personId: person.id });
  return credential === null ? null : { person, hash: credential.hash };
}

/** The company somebody was last in, or else joined first; null for somebody who is in none. */
export async function companyToEnter(manager: EntityManager, personId: string): Promise<MembershipRow | null> {
  const memberships = (
    await manager.find(Membership, { where: { personId }, order: { createdAt: 'ASC', companyId: 'ASC' } })
  ).filter((membership) => membership.roles.length > 0);
  const last = await manager.findOne(SignInSession, { where: { personId }, order: { createdAt: 'DESC' } });
  return memberships.find((membership) => membership.companyId === last?.companyId) ?? memberships[0] ?? null;
}

export async function readMe(manager: EntityManager, personId: string, companyId: string): Promise<Me | null> {
  const person = await manager.findOneBy(Person, { id: personId });
  const company = await manager.findOneBy(Company, { id: companyId });
  const membership = await manager.findOneBy(Membership, { companyId, personId });
  if (person === null || company === null || membership === null || membership.roles.length === 0) return null;
  return {
    person: { id: person.id, name: person.name, email: person.email },
    company: { id: company.id, name: company.name },
    roles: membership.roles,
  };
}

/** What is kept of a token. It is 256 bits of chance, so one fast pass is enough. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/** The token and its session, the session locked: two uses of one token come one after the other. */
export async function lockToken(
  manager: EntityManager,
  token: string,
): Promise<{ known: RefreshTokenRow; session: SessionRow } | null> {
  const known = await manager.findOneBy(RefreshToken, { hash: hashToken(token) });
  if (known === null) return null;
  const session = await manager.findOne(SignInSession, { where: { id: known.sessionId }, lock: { mode: 'pessimistic_write' } });
  return session === null ? null : { known, session };
}

export async function endSession(
  manager: EntityManager,
  id: string,
  endedAt: Date,
  endedBecause: SessionRow['endedBecause'],
): Promise<void> {
  await manager.update(SignInSession, { id }, { endedAt, endedBecause });
}
