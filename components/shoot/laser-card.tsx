import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { formatLength } from '@/analysis';
import { Button } from '@/components/ui/button';
import { Body, Figure, Strong } from '@/components/ui/text';
import { radius, space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundSeries } from '@/shared/round/round-state';
import { laserWords } from './laser-words';

interface LaserCardProps {
  series: RoundSeries;
  job: RoundBundle['job'];
  /** Absent: whoever looks on reads no benchmark. */
  onCheck?: () => void;
  /** The benchmark is being read: a first miss asks to read again before anything is called doubted. */
  checking?: boolean;
}

/** The height of instrument that elevations come from, and whether the laser stood still under it. */
export function LaserCard({ series, job, onCheck, checking = false }: LaserCardProps) {
  const tokens = useTokens();
  const { t } = useTranslation('shoot');
  const doubted = !checking && series.checks.some((check) => check.of === 'laser' && !check.holds);
  return (
    <View
      style={[
        styles.card,
        { backgroundColor: doubted ? tokens.cautionTint : tokens.paper, borderColor: doubted ? tokens.caution : tokens.rule },
      ]}
    >
      <View style={styles.words}>
        <Body>
          <Strong>{t('hi')}</Strong>{' '}
          <Figure weight="bold">{series.hi === null ? '–' : formatLength(series.hi, job.unitStyle, job.graduation)}</Figure>
        </Body>
        <View role="status">
          <Body size="small">{checking ? t('laser.checking') : laserWords(series)}</Body>
        </View>
      </View>
      {onCheck ? <Button label={t('check.button')} size="normal" onPress={onCheck} /> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  card: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space.s,
    borderWidth: 1,
    borderRadius: radius.card,
    paddingVertical: 5,
    paddingLeft: space.m,
    paddingRight: 6,
  },
  words: { flex: 1, minWidth: 0 },
});
