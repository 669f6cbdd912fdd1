import { useQuery } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { Loaded } from '@/components/query/loaded';
import { AccountRow } from '@/components/root/account-row';
import { Screen } from '@/components/ui/screen';
import { Body } from '@/components/ui/text';
import { Tiles } from '@/components/ui/tiles';
import { crewQuery } from '@/hooks/api/crew-queries';
import { useMay } from '@/hooks/session/use-session';
import { useWide } from '@/hooks/use-wide';
import { PersonCard } from './person-card';

/** The people of the company and what each of them is. */
export function CrewScreen() {
  const { t } = useTranslation('crew');
  const wide = useWide();
  const query = useQuery(crewQuery());
  const mayChange = useMay('people.manage');
  return (
    <Screen title={t('title')} large>
      <Loaded query={query} loading={t('loading')}>
        {(people) => (
          <>
            <Body tone="ink2">{mayChange ? t('whatRolesDo') : t('ownerChanges')}</Body>
            <Tiles least={340}>
              {people.map((person) => (
                <PersonCard key={person.id} person={person} mayChange={mayChange} />
              ))}
            </Tiles>
          </>
        )}
      </Loaded>
      {wide ? null : <AccountRow />}
    </Screen>
  );
}
