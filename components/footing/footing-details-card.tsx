import { useQuery } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { printLength, printSmall } from '@/components/lengths/print-length';
import { Card } from '@/components/ui/card';
import { ListRow } from '@/components/ui/list-row';
import { jobQuery } from '@/hooks/api/job-queries';
import type { Footing } from '@/shared/api/footing-schemas';

/** The figures of the drawing. */
export function FootingDetailsCard({ footing }: { footing: Footing }) {
  const { t } = useTranslation('footing');
  const { data: job } = useQuery(jobQuery(footing.jobId));
  if (!job) return null;
  const style = job.unitStyle;
  return (
    <Card title={t('new.drawing')}>
      <ListRow title={t('new.planGrade')} end={printLength(footing.planGrade, style)} />
      <ListRow title={t('new.width')} end={printSmall(footing.width, style)} />
      <ListRow title={t('new.thickness')} end={printSmall(footing.thickness, style)} />
      <ListRow title={t('new.wallThickness')} end={printSmall(footing.wallThickness, style)} />
      <ListRow title={t('new.measuredOn')} end={t(`measuredOn.${footing.measuredOn}`)} />
      <ListRow title={t('new.rails')} end={t(`rails.${footing.rails}`)} />
      {footing.railOffset === 0 ? null : <ListRow title={t('new.railOffset')} end={printSmall(footing.railOffset, style)} />}
      <ListRow
        title={t('new.dig')}
        end={footing.digNeeded ? t('new.digNeeded') : t('new.digNotNeeded')}
        last={!footing.landmark}
      />
      {footing.landmark ? <ListRow title={t('new.landmark')} end={footing.landmark.name} last /> : null}
    </Card>
  );
}
