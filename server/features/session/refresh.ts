import type { EntityManager } from 'typeorm';
import { RefreshToken, SignInSession, type RefreshTokenRow, type SessionRow } from '../../entities/people';
import type { Sources } from '../../dependencies';
import { endSession, hashToken, lockToken } from './session-store';

const GRACE_MS = 60_000;
/** Unused for this long, a sign-in is over. */
export const SIGN_IN_LASTS_MS = 30 * 24 * 60 * 60 * 1000;

export interface FreshToken {
  token: string;
  expiresAt: Date;
  session: Pick<SessionRow, 'id' | 'personId' | 'companyId'>;
}

/** 256 bits of chance. */
export function newToken(sources: Sources): string {
  return Buffer.from(sources.randomBytes(32)).toString('base64url');
}

export async function keepToken(
  manager: EntityManager,
  token: string,
  at: Pick<RefreshTokenRow, 'sessionId' | 'generation' | 'issuedAt'>,
): Promise<void> {
  await manager.insert(RefreshToken, { hash: hashToken(token), ...at });
}

/**
 * Takes a refresh token and gives the next one; null when it is good for nothing.
 *
 * A token of the newest generation starts the next. One of the generation before, within a minute of that, gets another of the
 * newest: the answer with the first one may have been lost on the way. Anything older was used by somebody who kept it,
 * and which of the two is the thief nobody can say: the whole family ends.
 */
export async function rotate(manager: EntityManager, token: string, sources: Sources): Promise<FreshToken | null> {
  const now = sources.now();
  const found = await lockToken(manager, token);
  if (found === null || found.session.endedAt !== null || found.session.expiresAt <= now) return null;
  const { known, session } = found;
  const behind = session.generation - known.generation;
  const inGrace = behind === 1 && now.getTime() - session.rotatedAt.getTime() <= GRACE_MS;
  if (behind > 0 && !inGrace) {
    await endSession(manager, session.id, now, 'token-reused');
    return null;
  }
  const next = newToken(sources);
  const generation = inGrace ? session.generation : session.generation + 1;
  const expiresAt = new Date(now.getTime() + SIGN_IN_LASTS_MS);
  await keepToken(manager, next, { sessionId: session.id, generation, issuedAt: now });
  await manager.update(SignInSession, { id: session.id }, inGrace ? { expiresAt } : { generation, rotatedAt: now, expiresAt });
  return { token: next, expiresAt, session };
}
