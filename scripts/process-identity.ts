import { readdirSync, readFileSync, readlinkSync } from 'node:fs';
import { codeOf } from './error-code.mjs';

/** A process for certain: numbers are used again, a number with its start time is not. */
export interface ProcessIdentity {
  pid: number;
  started: string;
}

const hasCode = (error: unknown, ...codes: string[]): boolean => codes.includes(codeOf(error) ?? '');

/** The identity of a running process; undefined when there is none of that number. Start time is in clock ticks since boot, proc(5). */
export function identify(pid: number): ProcessIdentity | undefined {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The name, second, may hold spaces and brackets: what follows its last bracket is regular. Field 22 is the 20th after it.
    const started = stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19];
    return started === undefined ? undefined : { pid, started };
  } catch (error) {
    if (hasCode(error, 'ENOENT', 'ESRCH')) return undefined;
    throw error;
  }
}

/** Whether that very process still runs. */
export const stillRuns = ({ pid, started }: ProcessIdentity): boolean => identify(pid)?.started === started;

/** The processes that work in a folder, as far as this user may see: PostgreSQL's all work in their data folder. */
export function processesIn(folder: string): number[] {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .filter((pid) => {
      try {
        return readlinkSync(`/proc/${pid}/cwd`) === folder;
      } catch (error) {
        if (hasCode(error, 'ENOENT', 'EACCES', 'ESRCH', 'EPERM')) return false;
        throw error;
      }
    })
    .map(Number);
}
