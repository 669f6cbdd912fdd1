import { useTranslation } from 'react-i18next';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { useChangeRound } from '@/hooks/api/round-queries';
import type { ReadyRound } from '@/hooks/round/use-round';
import { LaserCard } from './laser-card';
import { RoundStrip } from './round-strip';
import { ShotNotes } from './shot-notes';

interface LookingOnProps {
  view: ReadyRound;
  /** Might shoot, were the round open. */
  may: boolean;
  /** May shoot rounds of the top, and this is none. */
  installer: boolean;
}

/** The round for whoever does not shoot it: everything to see, nothing to press by mistake. */
export function LookingOn({ view, may, installer }: LookingOnProps) {
  const { t } = useTranslation('shoot');
  const reopen = useChangeRound(view.bundle.round.id);
  const why = may ? 'closed' : installer ? 'roleInstaller' : 'role';
  const series = view.state.series.at(-1);
  return (
    <>
      <Notice
        kind="plain"
        actions={
          may ? (
            <Button label={t('readOnly.open')} busy={reopen.isPending} onPress={() => reopen.mutate({ closed: false })} />
          ) : undefined
        }
      >
        {t(`readOnly.${why}`)}
      </Notice>
      {series ? <LaserCard series={series} job={view.bundle.job} /> : null}
      <RoundStrip view={view} target={null} verdict={null} />
      <ShotNotes view={view} currentKey={null} />
    </>
  );
}
