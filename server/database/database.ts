import { DatabaseError } from 'pg';
import { QueryFailedError, type DataSource, type EntityManager, type QueryRunner } from 'typeorm';
import type { Logger } from 'pino';
import { ApiError, DatabaseAway } from '../errors';

/** Work under one of the two roles that the server may take. */
export interface Transactions {
  /** People, credentials, sessions, and entry into a company. */
  asIdentity<T>(work: (manager: EntityManager) => Promise<T>): Promise<T>;
  /** One company's data. */
  asCompany<T>(companyId: string, work: (manager: EntityManager) => Promise<T>): Promise<T>;
}

/** Takes a role, and with the company's the company, until the transaction ends or takes another. */
export async function takeRole(manager: EntityManager, role: 'identity' | 'company', companyId = ''): Promise<void> {
  const name = role === 'identity' ? 'tallyrod_identity' : 'tallyrod_app';
  await manager.query(`select set_config('role', $1, true), set_config('app.company_id', $2, true)`, [name, companyId]);
}

/**
 * The only way to the database. The server's sign-in has no rights of its own: each transaction takes a role for its own length,
 * and with the company's role the company, by which row-level security shows it that company's rows and no others.
 */
export class Database implements Transactions {
  constructor(
    private readonly source: DataSource,
    private readonly logger: Pick<Logger, 'warn'>,
  ) {}

  asIdentity<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    return this.transaction(async (runner) => {
      await takeRole(runner.manager, 'identity');
      return work(runner.manager);
    });
  }

  asCompany<T>(companyId: string, work: (manager: EntityManager) => Promise<T>): Promise<T> {
    return this.transaction(async (runner) => {
      await takeRole(runner.manager, 'company', companyId);
      return work(runner.manager);
    });
  }

  /** Resolves when the database answers. @throws DatabaseAway */
  async ping(): Promise<void> {
    await this.transaction(async (runner) => {
      await runner.query('set local statement_timeout = 2000');
      await runner.query('select 1');
    });
  }

  private async transaction<T>(work: (runner: QueryRunner) => Promise<T>): Promise<T> {
    const runner = this.source.createQueryRunner();
    try {
      await connect(runner);
      await runner.startTransaction();
      const result = await work(runner);
      await runner.commitTransaction();
      return result;
    } catch (error) {
      await this.rollBack(runner);
      throw isConnectionLost(error) ? new DatabaseAway(error) : error;
    } finally {
      await runner.release();
    }
  }

  private async rollBack(runner: QueryRunner): Promise<void> {
    if (!runner.isTransactionActive) return;
    try {
      await runner.rollbackTransaction();
    } catch (error) {
      // The server rolls back what it hears no more of; the first error is the one to tell.
      this.logger.warn({ err: error }, 'a transaction could not be rolled back');
    }
  }
}

async function connect(runner: QueryRunner): Promise<void> {
  try {
    await runner.connect();
  } catch (error) {
    throw new DatabaseAway(error);
  }
}

/** SQLSTATE classes and codes by which PostgreSQL says that it goes, comes, or is full. */
const GOING = /^(08...|57P0[1235]|53[123]00)$/;

/**
 * What PostgreSQL itself says has an SQLSTATE. What the driver says beside that (a socket that closed, a name that does not
 * resolve, a pool that waited too long) has none, and means that the connection is gone.
 */
function isConnectionLost(error: unknown): boolean {
  if (error instanceof ApiError || !(error instanceof QueryFailedError)) return false;
  const cause: unknown = error.driverError;
  return cause instanceof DatabaseError ? GOING.test(cause.code ?? '') : true;
}

/** The SQLSTATE of what PostgreSQL refused, or undefined for any other error. */
export function sqlState(error: unknown): string | undefined {
  return error instanceof QueryFailedError && error.driverError instanceof DatabaseError ? error.driverError.code : undefined;
}

/** A row with this key, or this name, is there already. */
export const UNIQUE_VIOLATION = '23505';

/** Text with a character that PostgreSQL keeps in no text: NUL. */
export const UNTENABLE_TEXT = '22021';
