import { useQuery } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { printRound, printSmall } from '@/components/lengths/print-length';
import { Loaded } from '@/components/query/loaded';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Column, Columns } from '@/components/ui/columns';
import { EmptyState } from '@/components/ui/empty-state';
import { ListRow } from '@/components/ui/list-row';
import { Screen } from '@/components/ui/screen';
import { Heading } from '@/components/ui/text';
import { Tiles } from '@/components/ui/tiles';
import { instrumentsQuery } from '@/hooks/api/instrument-queries';
import { useMay } from '@/hooks/session/use-session';
import type { Laser, Rod } from '@/shared/api/instrument-endpoints';
import { LaserCard } from './laser-card';

/** The register: the company's lasers with their checks, and its rods. */
export function LasersScreen() {
  const { t } = useTranslation('lasers');
  const query = useQuery(instrumentsQuery());
  const mayWrite = useMay('laser.write');
  const known = query.data;
  const addLaser = <Button variant="primary" size="large" grow label={t('addLaser')} href="/lasers/new" />;
  // With a laser but no rod the rod is the next step, and has the one primary button.
  const addRod = (
    <Button variant={known?.lasers.length ? 'primary' : 'outline'} size="large" grow label={t('addRod')} href="/rods/new" />
  );
  const both = (
    <>
      <Button variant="outline" size="large" grow label={t('addRod')} href="/rods/new" />
      {addLaser}
    </>
  );
  const complete = known !== undefined && known.lasers.length > 0 && known.rods.length > 0;
  return (
    <Screen title={t('title')} large actions={mayWrite && complete ? both : undefined}>
      <Loaded query={query} loading={t('loading')}>
        {({ lasers, rods }) => (
          <Columns>
            <Column share={2}>
              <Lasers lasers={lasers} add={mayWrite ? addLaser : undefined} />
            </Column>
            <Column>
              <Rods rods={rods} add={mayWrite ? addRod : undefined} />
            </Column>
          </Columns>
        )}
      </Loaded>
    </Screen>
  );
}

function Lasers({ lasers, add }: { lasers: readonly Laser[]; add: React.ReactNode }) {
  const { t } = useTranslation('lasers');
  if (lasers.length === 0) {
    return (
      <EmptyState title={t('noLaser')} action={add}>
        {add ? t('noLaserHow') : t('noLaserWait')}
      </EmptyState>
    );
  }
  return (
    <Tiles least={340}>
      {lasers.map((laser) => (
        <LaserCard key={laser.id} laser={laser} />
      ))}
    </Tiles>
  );
}

function Rods({ rods, add }: { rods: readonly Rod[]; add: React.ReactNode }) {
  const { t } = useTranslation(['lasers', 'jobs']);
  return (
    <>
      <Heading level={2} size="head">
        {t('lasers:rods')}
      </Heading>
      {rods.length === 0 ? (
        <EmptyState title={t('lasers:noRod')} action={add}>
          {add ? t('lasers:noRodHow') : t('lasers:noRodWait')}
        </EmptyState>
      ) : (
        <Card>
          {rods.map((rod, at) => (
            <ListRow
              key={rod.id}
              title={rod.name}
              note={t('lasers:rodWords', {
                style: t(`jobs:style.${rod.style}.name`),
                graduation: printSmall(rod.graduation, rod.style),
              })}
              end={printRound(rod.length, rod.style)}
              last={at === rods.length - 1}
            />
          ))}
        </Card>
      )}
    </>
  );
}
