import { useQuery } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { FootingCard } from '@/components/footing/footing-card';
import { Loaded } from '@/components/query/loaded';
import { AccountRow } from '@/components/root/account-row';
import { SavedPill } from '@/components/root/saved-pill';
import { Brand } from '@/components/shell/brand';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Column, Columns } from '@/components/ui/columns';
import { EmptyState } from '@/components/ui/empty-state';
import { ListRow } from '@/components/ui/list-row';
import { Screen } from '@/components/ui/screen';
import { Body, Heading } from '@/components/ui/text';
import { Tiles } from '@/components/ui/tiles';
import { todayQuery } from '@/hooks/api/job-queries';
import { useMay } from '@/hooks/session/use-session';
import { useWide } from '@/hooks/use-wide';
import type { FootingSummary } from '@/shared/api/footing-schemas';
import type { Waiting } from '@/shared/api/job-endpoints';
import { WaitingCard } from './waiting-card';
import { waitingWords } from './waiting-words';

/** What waits for whoever looks, most pressing first, and the footings in hand. */
export function TodayScreen() {
  const { t } = useTranslation('today');
  const wide = useWide();
  const query = useQuery(todayQuery());
  return (
    <Screen title={t('title')} large brand={<Brand pill={<SavedPill />} />} pill={wide ? <SavedPill /> : undefined}>
      <Loaded query={query} loading={t('loading')}>
        {({ waiting, footings }) => (
          <Columns>
            <Column>
              <WaitingPart waiting={waiting} nothingYet={footings.length === 0} />
            </Column>
            <Column share={2}>
              <FootingsPart footings={footings} offerJob={waiting[0]?.what !== 'enter-job'} />
            </Column>
          </Columns>
        )}
      </Loaded>
      {wide ? null : <AccountRow />}
    </Screen>
  );
}

function WaitingPart({ waiting, nothingYet }: { waiting: readonly Waiting[]; nothingYet: boolean }) {
  const { t } = useTranslation('today');
  const [first, ...others] = waiting;
  if (first === undefined)
    return <EmptyState title={t('nothing.title')}>{t(nothingYet ? 'nothing.noJobs' : 'nothing.how')}</EmptyState>;
  return (
    <>
      <WaitingCard waiting={first} />
      {others.length > 0 ? (
        <Card title={t('alsoWaiting')}>
          {others.map((one, at) => {
            const { title, note, href } = waitingWords(one);
            return <ListRow key={title + at} title={title} note={note} href={href} last={at === others.length - 1} />;
          })}
        </Card>
      ) : null}
    </>
  );
}

function FootingsPart({ footings, offerJob }: { footings: readonly FootingSummary[]; offerJob: boolean }) {
  const { t } = useTranslation(['today', 'results']);
  const mayAdd = useMay('job.write');
  if (footings.length === 0 && !(mayAdd && offerJob)) return null;
  return (
    <>
      <View style={styles.head}>
        <Heading level={2} size="head">
          {t('today:jobs')}
        </Heading>
        {mayAdd && offerJob ? <Button variant="quiet" size="small" label={t('today:newJob')} href="/jobs/new" /> : null}
      </View>
      {footings.length === 0 ? <Body tone="ink2">{t('today:noFootings')}</Body> : null}
      <Tiles least={360}>
        {footings.map((footing) => (
          <FootingCard key={footing.id} footing={footing} showJob />
        ))}
      </Tiles>
      {footings.length === 0 ? null : (
        <Body size="tiny" tone="ink2">
          {t('results:govern')}
        </Body>
      )}
    </>
  );
}

const styles = StyleSheet.create({
  head: { flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: space.m },
});
