import { formatLength } from '@/analysis';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Card } from '@/components/ui/card';
import { Table } from '@/components/ui/table';
import { Figure, type TextTone } from '@/components/ui/text';
import { space } from '@/constants/theme';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundResults } from '@/shared/round/round-results';
import type { RoundState, RoundTarget } from '@/shared/round/round-state';
import type { MarkKind } from '../charts/chart-types';
import { MarkIcon } from '../charts/marks';
import { offGradeWords } from '../lengths/length-words';
import { markOf } from './chart-data';
import { placeWords } from './place-words';
import { toMark } from './results-words';

interface StationsTableProps {
  bundle: RoundBundle;
  state: RoundState;
  results: RoundResults;
}

const tone: Record<MarkKind, TextTone> = { high: 'high', low: 'low', in: 'on', 'not-shot': 'ink2' };

/** Every station and rail in walking order: what was read there, and how far off grade that is. */
export function StationsTable({ bundle, state, results }: StationsTableProps) {
  const { t } = useTranslation('results');
  const suspects = new Set(results.suspects.map((suspect) => suspect.target.key));
  return (
    <Card title={t('table.title')} flush>
      <Table
        label={t('table.title')}
        dense
        columns={[
          { key: 'station', title: t('table.station'), share: 1.1 },
          { key: 'rod', title: t('table.rod'), align: 'right', share: 0.9 },
          { key: 'off', title: t('table.off'), align: 'right', share: 1.2 },
        ]}
        rows={state.targets.map((target) => ({
          key: target.key,
          cells: {
            station: placeWords(bundle.footing, target),
            rod: rodWords(target),
            off: <OffGrade bundle={bundle} target={target} suspect={suspects.has(target.key)} />,
          },
        }))}
      />
    </Card>
  );
}

/** What stands on the rod, in the marks that it was keyed in. */
function rodWords(target: RoundTarget): string {
  const record = target.deciding?.record;
  if (!record) return '—';
  // A set shot stands at the grade rod, which need not lie on a mark: it is printed to the finest one of its style.
  const finest = { 'feet-inches': 396_875, 'decimal-feet': 304_800, metric: 100_000 }[record.style];
  const usual = { 'feet-inches': 396_875, 'decimal-feet': 3_048_000, metric: 1_000_000 }[record.style];
  return formatLength(record.reading, record.style, record.reading % usual === 0 ? usual : finest);
}

function OffGrade({ bundle, target, suspect }: { bundle: RoundBundle; target: RoundTarget; suspect: boolean }) {
  const { t } = useTranslation('results');
  const mark = markOf(target);
  const shot = target.deciding;
  const words =
    shot === null
      ? t('table.notShot')
      : shot.deviation === null
        ? t('table.noElevation')
        : offGradeWords(toMark(shot.deviation, bundle.job.graduation), bundle.job.unitStyle);
  return (
    <View style={styles.off}>
      <MarkIcon station={{ mark, close: shot?.close ?? false, suspect }} />
      <Figure size="small" tone={tone[mark]} align="right">
        {words}
      </Figure>
    </View>
  );
}

const styles = StyleSheet.create({ off: { flexDirection: 'row', alignItems: 'center', gap: space.xs, flexShrink: 1 } });
