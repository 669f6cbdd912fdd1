import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { Body } from '@/components/ui/text';
import type { ChartStation } from './chart-types';
import { MarkIcon } from './marks';

const signs = [
  { key: 'high', station: { mark: 'high' } },
  { key: 'in', station: { mark: 'in' } },
  { key: 'low', station: { mark: 'low' } },
  { key: 'close', station: { mark: 'in', close: true } },
  { key: 'suspect', station: { mark: 'in', suspect: true } },
  { key: 'not-shot', station: { mark: 'not-shot' } },
] as const satisfies readonly { key: string; station: Pick<ChartStation, 'mark' | 'close' | 'suspect'> }[];

/** What the marks mean. High, in and low are always said; the others when they are in the picture. */
export function Legend({ stations }: { stations: readonly ChartStation[] }) {
  const { t } = useTranslation('charts');
  const seen = new Set<string>(['high', 'in', 'low']);
  for (const { mark, close, suspect } of stations) {
    if (close) seen.add('close');
    if (suspect) seen.add('suspect');
    if (mark === 'not-shot') seen.add('not-shot');
  }
  return (
    <View role="list" aria-label={t('legend.label')} style={styles.row}>
      {signs
        .filter(({ key }) => seen.has(key))
        .map(({ key, station }) => (
          <View key={key} role="listitem" style={styles.sign}>
            <MarkIcon station={station} size={18} />
            <Body size="small">{t(`legend.${key}`)}</Body>
          </View>
        ))}
    </View>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space.l, rowGap: space.xs },
  sign: { flexDirection: 'row', alignItems: 'center', gap: space.xs },
});
