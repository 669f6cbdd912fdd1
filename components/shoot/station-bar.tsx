import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Icon } from '@/components/ui/icons';
import { Body, Heading, Strong } from '@/components/ui/text';
import { space } from '@/constants/theme';
import { KeysRegion } from './keys-region';
import { ShootKey } from './shoot-key';

interface StationBarProps {
  /** "C, 0+74, outer" */
  place: string;
  /** "4′ 7 3/8″"; null where there is none on this rod. */
  gradeRod: string | null;
  /** What was shot here before: "before adjusting 1/4″ low". */
  earlier: string | null;
  /** What to do before the next shot here, in place of both. */
  now: string | null;
  onStep: (by: 1 | -1) => void;
}

/** Where the rod goes now and what it reads at grade, with the way to the stations beside it. */
export function StationBar({ place, gradeRod, earlier, now, onStep }: StationBarProps) {
  const { t } = useTranslation('shoot');
  return (
    <KeysRegion label={place} style={styles.row}>
      <ShootKey label={t('station.previous')} style={styles.key} onPress={() => onStep(-1)}>
        <Icon name="chevron-left" />
      </ShootKey>
      <View role="status" style={styles.words}>
        <Heading level={2} size="title" align="center">
          {place}
        </Heading>
        {now === null ? (
          <Body size={earlier === null ? 'small' : 'tiny'} tone="ink2" align="center" numberOfLines={2}>
            {gradeRod === null ? null : (
              <>
                {t('station.gradeRod')} <Strong>{gradeRod}</Strong>
              </>
            )}
            {earlier === null ? null : `${gradeRod === null ? '' : ' · '}${earlier}`}
          </Body>
        ) : (
          <Body size="small" weight="bold" align="center">
            {now}
          </Body>
        )}
      </View>
      <ShootKey label={t('station.next')} style={styles.key} onPress={() => onStep(1)}>
        <Icon name="chevron-right" />
      </ShootKey>
    </KeysRegion>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', gap: space.s },
  key: { flexGrow: 0, flexShrink: 0, flexBasis: 56 },
  words: { flex: 1, minWidth: 0 },
});
