import { useTranslation } from 'react-i18next';
import { roleWords } from '@/components/root/role-words';
import { Card } from '@/components/ui/card';
import { Choice } from '@/components/ui/choice';
import { ListRow } from '@/components/ui/list-row';
import { Screen } from '@/components/ui/screen';
import { chooseLanguage } from '@/hooks/i18n/i18n';
import { useSession } from '@/hooks/session/use-session';
import { SignOutCard } from './sign-out-card';

/** Who is signed in, to which company, in which language, and the way out. */
export function AccountScreen() {
  const { t, i18n } = useTranslation('account');
  const { me } = useSession();
  if (me === null) return null;
  return (
    <Screen title={t('title')} large maxWidth={720}>
      <Card>
        <ListRow title={t('name')} end={me.person.name} />
        <ListRow title={t('email')} note={me.person.email} />
        <ListRow title={t('company')} end={me.company.name} />
        <ListRow title={t('roles')} note={roleWords(me.roles)} last />
      </Card>
      <Card title={t('language')}>
        <Choice
          label={t('language')}
          hideLabel
          options={[
            { value: 'en', label: 'English' },
            { value: 'es', label: 'Español' },
          ]}
          value={chooseLanguage([i18n.language])}
          onChange={(language) => void i18n.changeLanguage(language)}
        />
      </Card>
      <SignOutCard />
    </Screen>
  );
}
