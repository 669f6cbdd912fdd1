import { sign, verify } from 'jsonwebtoken';
import { z } from 'zod';
import { ApiError } from '../errors';

const LIVES_SECONDS = 10 * 60;
const ISSUER = 'tallyrod';

const claimsSchema = z.object({ sub: z.uuid(), company: z.uuid(), session: z.uuid() });

/** Who signed in where. Roles are not in it: they are read afresh for every request. */
export interface AccessClaims {
  personId: string;
  companyId: string;
  sessionId: string;
}

/** A token that is good for ten minutes, in the caller's memory only. */
export function issueAccessToken(claims: AccessClaims, secret: string, now: Date): { accessToken: string; expiresAt: string } {
  const issued = Math.floor(now.getTime() / 1000);
  const expires = issued + LIVES_SECONDS;
  const payload = { sub: claims.personId, company: claims.companyId, session: claims.sessionId, iat: issued, exp: expires };
  return {
    accessToken: sign({ ...payload, iss: ISSUER }, secret, { algorithm: 'HS256' }),
    expiresAt: new Date(expires * 1000).toISOString(),
  };
}

/** @throws ApiError 'signed-out' for a header that is absent, or a token that is forged, expired or not ours */
export function readAccessToken(authorization: string | undefined, secret: string, now: Date): AccessClaims {
  const token = /^Bearer ([\w.-]+)$/.exec(authorization ?? '')?.[1];
  if (token === undefined) throw new ApiError('signed-out', 'Nobody is signed in.');
  try {
    const payload = verify(token, secret, {
      algorithms: ['HS256'],
      issuer: ISSUER,
      clockTimestamp: Math.floor(now.getTime() / 1000),
    });
    const claims = claimsSchema.parse(payload);
    return { personId: claims.sub, companyId: claims.company, sessionId: claims.session };
  } catch (error) {
    throw new ApiError('signed-out', 'This sign-in is over.', undefined, { cause: error });
  }
}
