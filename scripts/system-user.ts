import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';

/** A user and group of the system that a process is to run as. */
export interface SystemUser {
  uid: number;
  gid: number;
}

export const isRoot = (): boolean => process.getuid?.() === 0;

/** A user by name, from /etc/passwd. */
export function systemUser(name: string): SystemUser | undefined {
  const fields = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'))
    .find(([login]) => login === name);
  return fields === undefined ? undefined : { uid: Number(fields[2]), gid: Number(fields[3]) };
}

/** Whether a user can pass through a folder and all above it: asked of the system itself, as that user. */
export function canReach(user: SystemUser, folder: string): boolean {
  return spawnSync('test', ['-x', folder], { ...user, cwd: '/', stdio: 'ignore' }).status === 0;
}
