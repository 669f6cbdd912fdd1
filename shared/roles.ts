/** What a person may be in a company. One person may hold several. */
export const ROLES = ['owner', 'super', 'operator', 'installer'] as const;
export type Role = (typeof ROLES)[number];

/**
 * Who may do what: the one table that the server refuses by and the screens hide by.
 * Reading is not listed: everyone in a company reads its jobs.
 */
const MAY = {
  'people.manage': ['owner'],
  'rules.change': ['owner'],
  'job.write': ['owner', 'super'],
  'footing.write': ['owner', 'super'],
  'benchmark.add': ['owner', 'super', 'operator'],
  'benchmark.change': ['owner', 'super'],
  'laser.write': ['owner', 'super'],
  /** An operator only until the first shot: see `outline.change-after-shots`. */
  'outline.change': ['owner', 'super', 'operator'],
  'outline.change-after-shots': ['owner', 'super'],
  'station.write': ['owner', 'super', 'operator'],
  /** An installer only rounds of the top: see `round.any-surface`. */
  'round.shoot': ['operator', 'installer'],
  'round.any-surface': ['operator'],
  'shot.strike-any': ['owner', 'super'],
  /** Records are shots of the own hand, or a super's strike of somebody else's. */
  'record.send': ['owner', 'super', 'operator', 'installer'],
} as const satisfies Record<string, readonly Role[]>;

export type Action = keyof typeof MAY;
export const ACTIONS: readonly Action[] = Object.keys(MAY) as Action[]; // Object.keys forgets the key type

/** Whether somebody with these roles may do this. */
export function may(roles: readonly Role[], action: Action): boolean {
  const allowed: readonly Role[] = MAY[action];
  return roles.some((role) => allowed.includes(role));
}
