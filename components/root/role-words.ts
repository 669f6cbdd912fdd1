import { i18n } from '@/hooks/i18n/i18n';
import { ROLES, type Role } from '@/shared/roles';

/** The roles of a person in words, in the order of the table: "super and laser operator". */
export function roleWords(roles: readonly Role[]): string {
  const words = ROLES.filter((role) => roles.includes(role)).map((role) => i18n.t(`common:role.${role}`));
  return new Intl.ListFormat(i18n.language, { type: 'conjunction' }).format(words);
}
