import { useTranslation } from 'react-i18next';
import { printLength } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { ListRow } from '@/components/ui/list-row';
import { Body } from '@/components/ui/text';
import { useMay } from '@/hooks/session/use-session';
import type { Job } from '@/shared/api/job-endpoints';

/** The points of known elevation of a job. */
export function BenchmarksCard({ job }: { job: Job }) {
  const { t } = useTranslation('jobs');
  const mayAdd = useMay('benchmark.add');
  return (
    <Card title={t('benchmark.title')}>
      {job.benchmarks.length === 0 ? <Body tone="ink2">{t('benchmark.none')}</Body> : null}
      {job.benchmarks.map((benchmark, at) => (
        <ListRow
          key={benchmark.id}
          title={benchmark.name}
          note={[benchmark.note, benchmark.version > 1 ? t('benchmark.corrected', { count: benchmark.version - 1 }) : '']
            .filter((part) => part !== '')
            .join(' · ')}
          end={printLength(benchmark.elevation, job.unitStyle)}
          last={at === job.benchmarks.length - 1}
        />
      ))}
      {mayAdd ? (
        <Button label={t('benchmark.add')} href={{ pathname: '/jobs/[jobId]/benchmarks/new', params: { jobId: job.id } }} />
      ) : null}
    </Card>
  );
}
