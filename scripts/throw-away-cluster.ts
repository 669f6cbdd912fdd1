import { randomBytes } from 'node:crypto';
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { codeOf } from './error-code.mjs';
import { startCluster } from './postgres-cluster';
import { identify, processesIn, stillRuns } from './process-identity';
import { canReach, isRoot, systemUser } from './system-user';

/** A cluster for one run of tests, gone with it. */
export interface ThrowAwayCluster {
  superUrl: string;
  end(): Promise<void>;
}

const PREFIX = 'tallyrod-test-';
const MADE_BY = 'made-by.json';

const places = (): string[] => [...new Set([tmpdir(), '/tmp', '/var/tmp'])].filter((folder) => existsSync(folder));

/** The first temporary folder that the user who runs PostgreSQL can reach: a root's own TMPDIR may be closed to it. */
function temporaryFolder(): string {
  const postgres = isRoot() ? systemUser('postgres') : undefined;
  const found = places().find((folder) => postgres === undefined || canReach(postgres, folder));
  if (found === undefined) throw new Error(`none of ${places().join(', ')} can be reached by the user postgres`);
  return mkdtempSync(join(found, PREFIX));
}

/** Whether a folder was made by a run of ours that is over. Another user's folder cannot be read, and is not ours to judge. */
function isAbandoned(folder: string): boolean {
  try {
    const maker: unknown = JSON.parse(readFileSync(join(folder, MADE_BY), 'utf8'));
    if (typeof maker !== 'object' || maker === null || !('pid' in maker) || !('started' in maker)) return false;
    return (
      typeof maker.pid === 'number' && typeof maker.started === 'string' && !stillRuns({ pid: maker.pid, started: maker.started })
    );
  } catch (error) {
    if (codeOf(error) === 'ENOENT' || codeOf(error) === 'EACCES') return false;
    throw error;
  }
}

/** Ends a server left in a folder. Its number alone would not do: by now another process may have it. */
function endServerIn(data: string): void {
  const pidFile = join(data, 'postmaster.pid');
  if (!existsSync(pidFile)) return;
  const pid = Number(readFileSync(pidFile, 'utf8').split('\n')[0]);
  if (processesIn(data).includes(pid)) process.kill(pid, 'SIGQUIT');
}

/** Clears away what runs of tests that were killed have left. */
function sweepAbandoned(): void {
  for (const place of places()) {
    for (const name of readdirSync(place).filter((entry) => entry.startsWith(PREFIX))) {
      const folder = join(place, name);
      if (!isAbandoned(folder)) continue;
      endServerIn(join(folder, 'data'));
      rmSync(folder, { recursive: true, force: true, maxRetries: 5 });
    }
  }
}

/**
 * Starts PostgreSQL in a temporary folder. It is ended and removed by `end()`, and in any case when this process exits; what a killed
 * process leaves is ended by the next one's start.
 */
export async function startThrowAwayCluster(): Promise<ThrowAwayCluster> {
  sweepAbandoned();
  const folder = temporaryFolder();
  writeFileSync(join(folder, MADE_BY), JSON.stringify(identify(process.pid)));
  const remove = (): void => rmSync(folder, { recursive: true, force: true });
  const cluster = await startCluster({ folder, password: randomBytes(18).toString('base64url'), durable: false }).catch(
    (error: unknown) => {
      remove();
      throw error;
    },
  );
  let over = false;
  const endNow = (): void => {
    if (over) return;
    over = true;
    cluster.stopNow();
    remove();
  };
  process.once('exit', endNow);
  return {
    superUrl: cluster.superUrl,
    end: async () => {
      process.off('exit', endNow);
      if (over) return;
      over = true;
      await cluster.stop();
      remove();
    },
  };
}
