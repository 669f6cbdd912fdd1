import { EntitySchema } from 'typeorm';
import type { Role } from '@/shared/roles';
import { companyId, id, integer, text, time, uuid } from './columns';

export interface CompanyRow {
  id: string;
  name: string;
  createdAt: Date;
}
export const Company = new EntitySchema<CompanyRow>({
  name: 'Company',
  tableName: 'companies',
  columns: { id, name: text, createdAt: time },
});

/** `email` is kept in lower case: it is who somebody is, not how they write it. */
export interface PersonRow {
  id: string;
  name: string;
  email: string;
  createdAt: Date;
}
export const Person = new EntitySchema<PersonRow>({
  name: 'Person',
  tableName: 'people',
  columns: { id, name: text, email: text, createdAt: time },
});

export interface CredentialRow {
  personId: string;
  hash: string;
  changedAt: Date;
}
export const Credential = new EntitySchema<CredentialRow>({
  name: 'Credential',
  tableName: 'credentials',
  columns: { personId: id, hash: text, changedAt: time },
});

export interface MembershipRow {
  companyId: string;
  personId: string;
  roles: Role[];
  createdAt: Date;
}
export const Membership = new EntitySchema<MembershipRow>({
  name: 'Membership',
  tableName: 'memberships',
  columns: { companyId, personId: id, roles: { type: 'text', array: true }, createdAt: time },
});

/** All that a company sees of its people. */
export interface CrewPersonRow {
  id: string;
  name: string;
  email: string;
}
export const CrewPerson = new EntitySchema<CrewPersonRow>({
  name: 'CrewPerson',
  tableName: 'crew_people',
  columns: { id, name: text, email: text },
});

/**
 * One sign-in: a family of refresh tokens. Those of the newest `generation` are good; those of the one before are good for a
 * minute after `rotatedAt`, because the answer that brought the newer one may have been lost.
 */
export interface SessionRow {
  id: string;
  personId: string;
  companyId: string;
  createdAt: Date;
  expiresAt: Date;
  generation: number;
  rotatedAt: Date;
  endedAt: Date | null;
  endedBecause: 'signed-out' | 'token-reused' | null;
}
export const SignInSession = new EntitySchema<SessionRow>({
  name: 'SignInSession',
  tableName: 'sessions',
  columns: {
    id,
    personId: uuid,
    companyId: uuid,
    createdAt: time,
    expiresAt: time,
    generation: integer,
    rotatedAt: time,
    endedAt: { ...time, nullable: true },
    endedBecause: { ...text, nullable: true },
  },
});

/** `hash`: SHA-256 of the token, hexadecimal. The token itself is in the person's browser and nowhere else. */
export interface RefreshTokenRow {
  hash: string;
  sessionId: string;
  generation: number;
  issuedAt: Date;
}
export const RefreshToken = new EntitySchema<RefreshTokenRow>({
  name: 'RefreshToken',
  tableName: 'refresh_tokens',
  columns: { hash: { type: 'text', primary: true }, sessionId: uuid, generation: integer, issuedAt: time },
});
