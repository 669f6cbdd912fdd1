import { useTranslation } from 'react-i18next';
import { ScrollView, StyleSheet, useWindowDimensions } from 'react-native';
import { placeWords } from '@/components/results/place-words';
import { Card } from '@/components/ui/card';
import { Table, type TableRow } from '@/components/ui/table';
import { Body, Figure } from '@/components/ui/text';
import type { ReadyRound } from '@/hooks/round/use-round';
import type { RoundShot, RoundTarget } from '@/shared/round/round-state';
import { deviationWords } from './earlier-words';
import { readingWords } from './record-words';

interface ShotNotesProps {
  view: ReadyRound;
  /** The target that is being shot. */
  currentKey: string | null;
  onPick?: (key: string) => void;
}

/** What was shot, newest first, struck lines and all. */
export function ShotNotes({ view, currentKey, onPick }: ShotNotesProps) {
  const { t } = useTranslation('shoot');
  const { state } = view;
  // What a wide window has left under the laser and the strip, so that the keys beside it stay where they are.
  const maxHeight = Math.max(useWindowDimensions().height - 500, 240);
  const shots = new Map(state.targets.flatMap((target) => target.shots.map((shot) => [shot.id, { shot, target }] as const)));
  const lines = state.series.flatMap((series) => series.readings.flatMap(({ record }) => shots.get(record.id) ?? [])).reverse();
  const columns = [
    { key: 'station', title: t('notes.station'), share: 1.2 },
    { key: 'rod', title: t('notes.rod'), align: 'right' as const },
    { key: 'off', title: t('notes.off'), align: 'right' as const, share: 1.2 },
  ];
  return (
    <Card title={t('notes.title')} flush>
      {lines.length === 0 ? (
        <Body style={styles.none}>{t('notes.none')}</Body>
      ) : (
        <ScrollView tabIndex={0} style={{ maxHeight }}>
          <Table
            label={t('notes.title')}
            columns={columns}
            rows={lines.map((line) => row(line, view, currentKey))}
            onPressRow={onPick && ((id) => onPick(shots.get(id)?.target.key ?? ''))}
          />
        </ScrollView>
      )}
    </Card>
  );
}

function row({ shot, target }: { shot: RoundShot; target: RoundTarget }, view: ReadyRound, currentKey: string | null): TableRow {
  return {
    key: shot.id,
    current: target.key === currentKey && shot.decides,
    cells: {
      station: placeWords(view.bundle.footing, target),
      rod: (
        <Figure size="small" struck={shot.struck !== null} align="right">
          {readingWords(shot.record)}
        </Figure>
      ),
      off: <Standing shot={shot} view={view} />,
    },
  };
}

function Standing({ shot, view }: { shot: RoundShot; view: ReadyRound }) {
  const { t } = useTranslation('shoot');
  if (shot.struck) {
    return (
      <Body size="tiny" tone="ink2" align="right">
        {t('notes.struck', { reason: t(`strike.${shot.struck.record.reason}`).toLocaleLowerCase() })}
      </Body>
    );
  }
  const tone = shot.verdict === 'high' || shot.verdict === 'low' ? shot.verdict : 'on';
  const words = shot.deviation === null ? '–' : deviationWords(shot.deviation, view.bundle.job);
  const after = shot.decides ? (shot.record.how === 'set' ? `, ${t('notes.set')}` : '') : `, ${t('notes.earlier')}`;
  return (
    <Figure size="small" tone={shot.decides ? tone : 'ink2'} align="right">
      {`${words}${after}`}
    </Figure>
  );
}

const styles = StyleSheet.create({
  none: { padding: 16 },
});
