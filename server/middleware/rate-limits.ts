import { createHash } from 'node:crypto';
import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit, type Store } from 'express-rate-limit';
import type { EntityManager } from 'typeorm';
import type { Dependencies } from '../dependencies';
import { ApiError } from '../errors';

const MINUTE = 60_000;

/**
 * Counts tries in the database, so that two servers on it count as one. A key is hashed before it is kept: it has an address in it.
 */
class SharedCount implements Store {
  readonly localKeys = false;

  constructor(
    readonly prefix: string,
    private readonly windowMs: number,
    private readonly dependencies: Pick<Dependencies, 'database' | 'sources' | 'logger'>,
  ) {}

  async increment(key: string): Promise<{ totalHits: number; resetTime: Date }> {
    const now = this.dependencies.sources.now();
    const row = await this.dependencies.database.asIdentity((manager) => this.countOne(manager, this.hashed(key), now));
    return { totalHits: row.hits, resetTime: row.resets_at };
  }

  private async countOne(manager: EntityManager, key: string, now: Date): Promise<{ hits: number; resets_at: Date }> {
    // Of two who tidy up at once, each takes what the other does not hold.
    await manager.query(
      `delete from rate_limits where key in (select key from rate_limits where resets_at <= $1 limit 100 for update skip locked)`,
      [now],
    );
    const rows: { hits: number; resets_at: Date }[] = await manager.query(
      `insert into rate_limits as known (key, hits, resets_at) values ($1, 1, $2)
       on conflict (key) do update set
         hits = case when known.resets_at <= $3 then 1 else known.hits + 1 end,
         resets_at = case when known.resets_at <= $3 then $2 else known.resets_at end
       returning hits, resets_at`,
      [key, new Date(now.getTime() + this.windowMs), now],
    );
    const [row] = rows;
    if (row === undefined) throw new Error('an upsert returned no row');
    return row;
  }

  /** Called after the answer has gone, when nobody is left to tell: a try too many stays counted, and the log says why. */
  async decrement(key: string): Promise<void> {
    try {
      await this.dependencies.database.asIdentity((manager) =>
        manager.query('update rate_limits set hits = hits - 1 where key = $1 and hits > 0', [this.hashed(key)]),
      );
    } catch (error) {
      this.dependencies.logger.warn({ err: error }, 'a try that succeeded stays counted');
    }
  }

  async resetKey(key: string): Promise<void> {
    await this.dependencies.database.asIdentity((manager) =>
      manager.query('delete from rate_limits where key = $1', [this.hashed(key)]),
    );
  }

  private hashed(key: string): string {
    return createHash('sha256').update(`${this.prefix}${key}`).digest('hex');
  }
}

interface Limit {
  name: string;
  tries: number;
  windowMs: number;
  key(request: Request): string;
  /** A try that succeeds is not counted. */
  failuresOnly: boolean;
}

function limit({ name, tries, windowMs, key, failuresOnly }: Limit, dependencies: Dependencies): RequestHandler {
  return rateLimit({
    windowMs,
    limit: tries,
    store: new SharedCount(`${name}:`, windowMs, dependencies),
    keyGenerator: key,
    skipSuccessfulRequests: failuresOnly,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    identifier: name,
    handler: (_request, _response, next) => next(new ApiError('too-many-tries', 'Too many tries. Wait a while.')),
  });
}

const address = (request: Request): string => ipKeyGenerator(request.ip ?? 'unknown');

/** The e-mail address as it will be looked up, or nothing where the body has none: that is refused further on. */
function emailOf(request: Request): string {
  const body: unknown = request.body;
  const email: unknown = typeof body === 'object' && body !== null && 'email' in body ? body.email : '';
  return typeof email === 'string' ? email.trim().toLowerCase() : '';
}

/** Guesses at one person's passphrase from one place; at many people's from one place; and sign-ups from one place. */
export function signInLimits(dependencies: Dependencies): RequestHandler[] {
  const onePerson = (request: Request) => `${address(request)} ${emailOf(request)}`;
  return [
    limit({ name: 'sign-in', tries: 10, windowMs: 15 * MINUTE, key: onePerson, failuresOnly: true }, dependencies),
    limit({ name: 'sign-in-place', tries: 200, windowMs: 15 * MINUTE, key: address, failuresOnly: true }, dependencies),
  ];
}

export function signUpLimits(dependencies: Dependencies): RequestHandler[] {
  const onePerson = (request: Request) => `${address(request)} ${emailOf(request)}`;
  return [
    limit({ name: 'sign-up', tries: 10, windowMs: 15 * MINUTE, key: onePerson, failuresOnly: true }, dependencies),
    limit({ name: 'sign-up-place', tries: 200, windowMs: 60 * MINUTE, key: address, failuresOnly: false }, dependencies),
  ];
}
