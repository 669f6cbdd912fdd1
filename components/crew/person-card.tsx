import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { FieldPair } from '@/components/forms/field-pair';
import { roleWords } from '@/components/root/role-words';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { CheckBox } from '@/components/ui/check-box';
import { Notice } from '@/components/ui/notice';
import { Body } from '@/components/ui/text';
import { ApiError } from '@/hooks/api/client';
import { useChangeRoles } from '@/hooks/api/crew-queries';
import { ROLES, type Role } from '@/shared/roles';

export interface Person {
  id: string;
  name: string;
  email: string;
  roles: Role[];
}

/** A person with their roles in words; whoever owns the company may change them. */
export function PersonCard({ person, mayChange }: { person: Person; mayChange: boolean }) {
  const { t } = useTranslation(['crew', 'common']);
  const [open, setOpen] = useState(false);
  return (
    <Card title={person.name}>
      <Body size="small" tone="ink2">
        {person.email}
      </Body>
      {open ? null : <Body>{roleWords(person.roles)}</Body>}
      {mayChange && !open ? (
        <Button
          variant="plain"
          label={t('crew:change')}
          spokenLabel={t('crew:changeOf', { name: person.name })}
          onPress={() => setOpen(true)}
        />
      ) : null}
      {open ? <RolesEditor person={person} onClose={() => setOpen(false)} /> : null}
    </Card>
  );
}

function RolesEditor({ person, onClose }: { person: Person; onClose: () => void }) {
  const { t } = useTranslation(['crew', 'common']);
  const change = useChangeRoles();
  const [roles, setRoles] = useState<readonly Role[]>(person.roles);
  const toggle = (role: Role, checked: boolean) =>
    setRoles(ROLES.filter((one) => (one === role ? checked : roles.includes(one))));
  const save = () => change.mutate({ personId: person.id, roles: [...roles] }, { onSuccess: onClose });
  return (
    <>
      {ROLES.map((role) => (
        <CheckBox
          key={role}
          label={t(`common:role.${role}`)}
          note={t(`crew:does.${role}`)}
          checked={roles.includes(role)}
          onChange={(checked) => toggle(role, checked)}
        />
      ))}
      {roles.length === 0 ? <Notice kind="refusal">{t('crew:oneAtLeast')}</Notice> : null}
      {change.error === null ? null : <Notice kind="refusal">{refusalOf(change.error, t('crew:lastOwner'))}</Notice>}
      <FieldPair>
        <Button label={t('common:action.cancel')} variant="plain" onPress={onClose} />
        <Button label={t('common:action.save')} disabled={roles.length === 0} busy={change.isPending} onPress={save} />
      </FieldPair>
    </>
  );
}

/** The one thing about roles that cannot be: a company without an owner. */
function refusalOf(error: unknown, lastOwner: string): string {
  return error instanceof ApiError && error.code === 'not-possible' ? lastOwner : describeError(error);
}
