import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { printSmall } from '@/components/lengths/print-length';
import { Choice } from '@/components/ui/choice';
import { LengthText } from '@/components/ui/length-text';
import { Body, Label } from '@/components/ui/text';
import { radius, space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { UnitStyle } from '@/shared/quantities';
import type { Laser } from '@/shared/api/instrument-endpoints';
import type { Receiver } from './use-recording';

interface SetPanelProps {
  /** The grade rod, printed. */
  gradeRod: string;
  laser: Laser | null;
  style: UnitStyle;
  receiver: Receiver;
  onReceiver: (receiver: Receiver) => void;
}

/** The receiver clamped at the grade rod and the rail moved to the tone: what to set, and how wide the receiver's band is. */
export function SetPanel({ gradeRod, laser, style, receiver, onReceiver }: SetPanelProps) {
  const tokens = useTokens();
  const { t } = useTranslation('shoot');
  const width = (band: Receiver) => (laser ? printSmall(band === 'fine' ? laser.receiverFine : laser.receiverCoarse, style) : '');
  return (
    <View style={styles.panel}>
      <View style={[styles.rod, { backgroundColor: tokens.paper, borderColor: tokens.ink }]}>
        <Label weight="semibold">{t('station.gradeRod')}</Label>
        <LengthText value={gradeRod} size="verdict" align="right" />
      </View>
      <Body>{t('set.how')}</Body>
      <Choice
        label={t('set.band')}
        options={(['fine', 'coarse'] as const).map((band) => ({ value: band, label: t(`set.${band}`, { width: width(band) }) }))}
        value={receiver}
        onChange={onReceiver}
      />
    </View>
  );
}

const styles = StyleSheet.create({
  // As high as the keys, so that Record stays under the thumb.
  panel: { gap: space.m, minHeight: 300 },
  rod: {
    minHeight: 58,
    borderWidth: 2,
    borderRadius: radius.button,
    paddingHorizontal: space.m,
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'space-between',
  },
});
