import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Card } from '@/components/ui/card';
import { Body, Figure } from '@/components/ui/text';
import { space } from '@/constants/theme';
import { stationName } from '@/shared/station-name';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundResults, StraightedgeResult } from '@/shared/round/round-results';
import { printRound, printSmall } from '../lengths/print-length';
import { toMark } from './results-words';

const SHOWN = 3;

/** The worst gaps under a 10 ft (3 m) straightedge laid anywhere along a straight piece, and where stations are too far apart to say. */
export function StraightedgeCard({ bundle, straightedge }: { bundle: RoundBundle; straightedge: RoundResults['straightedge'] }) {
  const { t } = useTranslation('results');
  const { unitStyle, graduation } = bundle.job;
  const gaps = straightedge.results
    .flatMap((result) => (result.worst ? [{ result, worst: result.worst }] : []))
    .filter(({ worst }) => toMark(worst.gap, graduation) > 0)
    .sort((one, other) => other.worst.gap - one.worst.gap)
    .slice(0, SHOWN);
  return (
    <Card title={t('straightedge.title', { length: printRound(straightedge.length, unitStyle) })}>
      {gaps.length === 0 ? <Body tone="ink2">{t('straightedge.flat')}</Body> : null}
      {gaps.map(({ result, worst }) => (
        <View key={result.segment.id} style={styles.row}>
          <Body style={styles.place}>{t('straightedge.near', { place: placeAlong(bundle, result, worst.at) })}</Body>
          <Figure align="right">{t('straightedge.gap', { gap: printSmall(toMark(worst.gap, graduation), unitStyle) })}</Figure>
        </View>
      ))}
      {straightedge.results.some((result) => result.tooSparse) ? (
        <Body tone="ink2">{t('straightedge.tooSparse', { half: printRound(straightedge.length / 2, unitStyle) })}</Body>
      ) : null}
    </Card>
  );
}

/** Where a distance along a straight piece lies on the walk, as a station name. */
function placeAlong(bundle: RoundBundle, { segment }: StraightedgeResult, distance: number): string {
  const shot = segment.targets.findIndex((target) => target.deciding?.elevation != null);
  const before = (segment.targets[shot]?.at ?? 0) - (segment.distances[shot] ?? 0);
  return stationName(before + distance, bundle.job.unitStyle);
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'baseline', justifyContent: 'space-between', columnGap: space.m },
  place: { flexShrink: 1 },
});
