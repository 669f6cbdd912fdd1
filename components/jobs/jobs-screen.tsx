import { useQuery } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { footingWords } from '@/components/footing/footing-words';
import { StagesLine } from '@/components/footing/stages-line';
import { Loaded } from '@/components/query/loaded';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { Icon } from '@/components/ui/icons';
import { Screen } from '@/components/ui/screen';
import { Body, Heading } from '@/components/ui/text';
import { Tiles } from '@/components/ui/tiles';
import { jobsQuery } from '@/hooks/api/job-queries';
import { useMay } from '@/hooks/session/use-session';
import type { JobSummary } from '@/shared/api/job-endpoints';

/** Every job of the company, newest first, with its footings. */
export function JobsScreen() {
  const { t } = useTranslation('jobs');
  const query = useQuery(jobsQuery());
  const mayAdd = useMay('job.write');
  const empty = query.data?.length === 0;
  const add = <Button variant="primary" size="large" grow label={t('list.add')} href="/jobs/new" />;
  return (
    <Screen title={t('title')} large actions={mayAdd && !empty ? add : undefined}>
      <Loaded query={query} loading={t('list.loading')}>
        {(jobs) =>
          jobs.length === 0 ? (
            <EmptyState title={t('list.none')} action={mayAdd ? add : undefined}>
              {mayAdd ? t('list.noneHow') : t('list.noneWait')}
            </EmptyState>
          ) : (
            <Tiles least={360}>
              {jobs.map((job) => (
                <JobCard key={job.id} job={job} />
              ))}
            </Tiles>
          )
        }
      </Loaded>
    </Screen>
  );
}

function JobCard({ job }: { job: JobSummary }) {
  const { t } = useTranslation('jobs');
  return (
    <Card href={{ pathname: '/jobs/[jobId]', params: { jobId: job.id } }} style={styles.card}>
      <View style={styles.head}>
        <View style={styles.names}>
          <Heading level={2} size="head">
            {job.name}
          </Heading>
          {job.address === '' ? null : (
            <Body size="small" tone="ink2">
              {job.address}
            </Body>
          )}
        </View>
        <Icon name="chevron-right" size={20} />
      </View>
      {job.footings.length === 0 ? <Body tone="ink2">{t('list.noFooting')}</Body> : null}
      {job.footings.map((footing) => (
        <View key={footing.id} style={styles.footing}>
          <Body weight="semibold">{footing.name}</Body>
          <StagesLine done={footing.stages.done} current={footing.stages.now} />
          <Body size="small" tone="ink2">
            {footingWords(footing)}
          </Body>
        </View>
      ))}
    </Card>
  );
}

const styles = StyleSheet.create({
  card: { gap: space.m },
  head: { flexDirection: 'row', alignItems: 'flex-start', gap: space.s },
  names: { flex: 1, minWidth: 0 },
  footing: { gap: space.xs },
});
