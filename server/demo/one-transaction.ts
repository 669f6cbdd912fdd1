import type { DataSource, EntityManager } from 'typeorm';
import { takeRole, type Transactions } from '../database/database';

/** One at a time, and the second finds what the first laid. */
const LOCK = `select pg_advisory_xact_lock(hashtext('tallyrod demo'))`;

/** Everything in one transaction, whichever role a part of it takes: a demo is there whole or not at all. */
export function inOneTransaction<T>(source: DataSource, work: (database: Transactions) => Promise<T>): Promise<T> {
  return source.transaction(async (manager) => {
    await manager.query(LOCK);
    return work(transactionsWithin(manager));
  });
}

function transactionsWithin(manager: EntityManager): Transactions {
  return {
    asIdentity: async (work) => {
      await takeRole(manager, 'identity');
      return work(manager);
    },
    asCompany: async (companyId, work) => {
      await takeRole(manager, 'company', companyId);
      return work(manager);
    },
  };
}
