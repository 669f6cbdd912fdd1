import { useQuery } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { FootingCard } from '@/components/footing/footing-card';
import { printSmall } from '@/components/lengths/print-length';
import { Loaded } from '@/components/query/loaded';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Column, Columns } from '@/components/ui/columns';
import { EmptyState } from '@/components/ui/empty-state';
import { ListRow } from '@/components/ui/list-row';
import { Screen } from '@/components/ui/screen';
import { Body, Heading } from '@/components/ui/text';
import { Tiles } from '@/components/ui/tiles';
import { jobQuery } from '@/hooks/api/job-queries';
import { useMay } from '@/hooks/session/use-session';
import type { Job } from '@/shared/api/job-endpoints';
import { SURFACES } from '@/shared/rules';
import { BedRuleCard } from './bed-rule-card';
import { BenchmarksCard } from './benchmarks-card';
import { ToleranceRuleRow } from './tolerance-rule-row';

/** One job: its footings first, beside them what it is measured from and judged by. */
export function JobScreen({ jobId }: { jobId: string }) {
  const { t } = useTranslation('jobs');
  const query = useQuery(jobQuery(jobId));
  const mayAdd = useMay('footing.write');
  const job = query.data;
  const add = (
    <Button
      variant="primary"
      size="large"
      grow
      label={t('job.addFooting')}
      href={{ pathname: '/jobs/[jobId]/footings/new', params: { jobId } }}
    />
  );
  const empty = job?.footings.length === 0;
  return (
    <Screen
      title={job?.name ?? t('job.title')}
      subtitle={job?.address}
      back="/jobs"
      crumbs={[{ label: t('title'), href: '/jobs' }]}
      actions={mayAdd && job && !empty ? add : undefined}
    >
      <Loaded query={query} loading={t('job.loading')}>
        {(loaded) => (
          <Columns>
            <Column share={2}>
              <Footings job={loaded} add={mayAdd ? add : undefined} />
            </Column>
            <Column>
              <BenchmarksCard job={loaded} />
              <Card title={t('rule.title')}>
                {SURFACES.map((surface, at) => (
                  <ToleranceRuleRow key={surface} job={loaded} surface={surface} last={at === SURFACES.length - 1} />
                ))}
              </Card>
              <BedRuleCard job={loaded} />
              <DetailsCard job={loaded} />
            </Column>
          </Columns>
        )}
      </Loaded>
    </Screen>
  );
}

function Footings({ job, add }: { job: Job; add: React.ReactNode }) {
  const { t } = useTranslation(['jobs', 'results']);
  if (job.footings.length === 0) {
    return (
      <EmptyState title={t('jobs:job.noFooting')} action={add}>
        {add ? t('jobs:job.noFootingHow') : t('jobs:job.noFootingWait')}
      </EmptyState>
    );
  }
  return (
    <>
      <Heading level={2} size="head">
        {t('jobs:job.footings')}
      </Heading>
      <Tiles least={360}>
        {job.footings.map((footing) => (
          <FootingCard key={footing.id} footing={footing} />
        ))}
      </Tiles>
      <Body size="tiny" tone="ink2">
        {t('results:govern')}
      </Body>
    </>
  );
}

function DetailsCard({ job }: { job: Job }) {
  const { t } = useTranslation('jobs');
  return (
    <Card title={t('job.details')}>
      <ListRow title={t('new.unitStyle')} end={t(`style.${job.unitStyle}.name`)} />
      <ListRow title={t('new.graduation')} end={printSmall(job.graduation, job.unitStyle)} />
      <ListRow title={t('new.wallType')} end={t(`wall.${job.wallType}`)} last />
    </Card>
  );
}
