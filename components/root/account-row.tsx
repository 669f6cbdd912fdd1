import { useTranslation } from 'react-i18next';
import { Card } from '@/components/ui/card';
import { ListRow } from '@/components/ui/list-row';
import { useSession } from '@/hooks/session/use-session';
import { roleWords } from './role-words';

/** On a phone, where there is no rail: who is signed in, and the way to the account. */
export function AccountRow() {
  const { t } = useTranslation('common');
  const { me } = useSession();
  if (me === null) return null;
  return (
    <Card>
      <ListRow title={me.company.name} note={t('shell.signedInAs', { role: roleWords(me.roles) })} href="/account" last />
    </Card>
  );
}
