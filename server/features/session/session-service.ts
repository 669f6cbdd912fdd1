import type { Me, Session } from '@/shared/api/session-endpoints';
import { ROLES } from '@/shared/roles';
import type { EntityManager } from 'typeorm';
import { issueAccessToken } from '../../api/access-token';
import { sqlState, UNIQUE_VIOLATION, type Transactions } from '../../database/database';
import { newId, type Dependencies } from '../../dependencies';
import { Company, Credential, Membership, Person, SignInSession } from '../../entities/people';
import { ApiError, notPossible } from '../../errors';
import { isEasilyGuessed } from './easily-guessed';
import { hashPassphrase, isPassphrase } from './passphrase';
import { keepToken, newToken, rotate, SIGN_IN_LASTS_MS, type FreshToken } from './refresh';
import { companyToEnter, endSession, findPerson, lockToken, readMe, sameEmail } from './session-store';

export interface SignUp {
  company: string;
  name: string;
  email: string;
  password: string;
}

export interface SignedIn {
  session: Session;
  refresh: FreshToken;
}

type Needs = Pick<Dependencies, 'config' | 'sources'> & { database: Transactions };

export const SALT_BYTES = 16;

/** The one answer to a wrong passphrase and to an address that nobody has. */
function signInRefused(): ApiError {
  return new ApiError('sign-in-refused', 'This address and passphrase do not go together.');
}

/**
 * A new company whose one person has all four roles. Somebody who is known already proves it by their passphrase, and has a company more.
 * @throws ApiError 'not-possible' for a passphrase that is easily guessed; 'sign-in-refused' for an address in use with another one
 */
export async function signUp(needs: Needs, input: SignUp): Promise<SignedIn> {
  if (isEasilyGuessed(input.password, [input.company, input.name, input.email])) {
    throw notPossible('password', 'passphrase-easily-guessed', 'This passphrase is one that others would try.');
  }
  const known = await needs.database.asIdentity((manager) => findPerson(manager, input.email));
  if (known !== null && !(await isPassphrase(input.password, known.hash))) throw signInRefused();
  const hash = known === null ? await hashPassphrase(input.password, needs.sources.randomBytes(SALT_BYTES)) : null;
  try {
    return await needs.database.asIdentity(async (manager) => {
      const personId = known?.person.id ?? newId(needs.sources);
      if (hash !== null) await addPerson(manager, needs, { id: personId, name: input.name, email: input.email, hash });
      const companyId = await addCompany(manager, needs, input.company, personId);
      return startSession(manager, needs, personId, companyId);
    });
  } catch (error) {
    // Two signed up with one address at once.
    if (sqlState(error) === UNIQUE_VIOLATION) throw signInRefused();
    throw error;
  }
}

/** A person and how they prove that it is they. Belongs to no company yet. */
export async function addPerson(
  manager: EntityManager,
  needs: Pick<Needs, 'sources'>,
  person: { id: string; name: string; email: string; hash: string },
): Promise<void> {
  const now = needs.sources.now();
  await manager.insert(Person, { id: person.id, name: person.name, email: sameEmail(person.email), createdAt: now });
  await manager.insert(Credential, { personId: person.id, hash: person.hash, changedAt: now });
}

async function addCompany(manager: EntityManager, needs: Needs, name: string, personId: string): Promise<string> {
  const id = newId(needs.sources);
  const createdAt = needs.sources.now();
  await manager.insert(Company, { id, name, createdAt });
  await manager.insert(Membership, { companyId: id, personId, roles: [...ROLES], createdAt });
  return id;
}

/** @throws ApiError 'sign-in-refused', whichever of the two is wrong */
export async function signIn(needs: Needs, input: { email: string; password: string }): Promise<SignedIn> {
  const known = await needs.database.asIdentity((manager) => findPerson(manager, input.email));
  const right = await isPassphrase(input.password, known?.hash ?? null);
  if (known === null || !right) throw signInRefused();
  return needs.database.asIdentity(async (manager) => {
    const membership = await companyToEnter(manager, known.person.id);
    if (membership === null) throw signInRefused();
    return startSession(manager, needs, known.person.id, membership.companyId);
  });
}

/** @throws ApiError 'refresh-refused' */
export async function refresh(needs: Needs, token: string | null): Promise<SignedIn> {
  const signedIn = await needs.database.asIdentity(async (manager) => {
    const fresh = token === null ? null : await rotate(manager, token, needs.sources);
    if (fresh === null) return null;
    const me = await readMe(manager, fresh.session.personId, fresh.session.companyId);
    return me === null ? null : { session: sessionOf(needs, fresh, me), refresh: fresh };
  });
  // Thrown out here, so that the end of a family is kept.
  if (signedIn === null) throw new ApiError('refresh-refused', 'This sign-in is over.');
  return signedIn;
}

/** Ends the sign-in that the token belongs to; a token that is none ends nothing. */
export async function signOut(needs: Needs, token: string | null): Promise<void> {
  if (token === null) return;
  await needs.database.asIdentity(async (manager) => {
    const found = await lockToken(manager, token);
    if (found !== null && found.session.endedAt === null) {
      await endSession(manager, found.session.id, needs.sources.now(), 'signed-out');
    }
  });
}

async function startSession(manager: EntityManager, needs: Needs, personId: string, companyId: string): Promise<SignedIn> {
  const me = await readMe(manager, personId, companyId);
  if (me === null) throw signInRefused();
  const now = needs.sources.now();
  const session = { id: newId(needs.sources), personId, companyId };
  const expiresAt = new Date(now.getTime() + SIGN_IN_LASTS_MS);
  const times = { createdAt: now, rotatedAt: now, expiresAt };
  await manager.insert(SignInSession, { ...session, ...times, generation: 1, endedAt: null, endedBecause: null });
  const token = newToken(needs.sources);
  await keepToken(manager, token, { sessionId: session.id, generation: 1, issuedAt: now });
  const fresh = { token, expiresAt, session };
  return { session: sessionOf(needs, fresh, me), refresh: fresh };
}

function sessionOf(needs: Needs, fresh: FreshToken, me: Me): Session {
  const claims = { personId: fresh.session.personId, companyId: fresh.session.companyId, sessionId: fresh.session.id };
  return { ...issueAccessToken(claims, needs.config.jwtSecret, needs.sources.now()), me };
}
