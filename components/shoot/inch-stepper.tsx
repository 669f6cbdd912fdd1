import { useTranslation } from 'react-i18next';
import { Pressable, StyleSheet, View } from 'react-native';
import { Icon } from '@/components/ui/icons';
import { Figure, Label } from '@/components/ui/text';
import { radius, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { KeysRegion } from './keys-region';

interface InchStepperProps {
  inches: number | null;
  onStep: (by: 1 | -1) => void;
}

/** One inch up or down the rod; twelve carry into the foot. */
export function InchStepper({ inches, onStep }: InchStepperProps) {
  const tokens = useTokens();
  const { t } = useTranslation('shoot');
  return (
    <KeysRegion label={t('inches')} style={[styles.box, { borderColor: tokens.rule2, backgroundColor: tokens.paper }]}>
      <Pressable role="button" aria-label={t('inchLess')} onPress={() => onStep(-1)} style={styles.step}>
        <Icon name="minus" size={22} />
      </Pressable>
      <View aria-hidden style={[styles.middle, { borderColor: tokens.rule }]}>
        <Figure size="head" align="center">
          {inches ?? '–'}
        </Figure>
        <Label size="tiny" align="center">
          {t('inch')}
        </Label>
      </View>
      <Pressable role="button" aria-label={t('inchMore')} onPress={() => onStep(1)} style={styles.step}>
        <Icon name="plus" size={22} />
      </Pressable>
    </KeysRegion>
  );
}

const styles = StyleSheet.create({
  box: { flexDirection: 'row', borderWidth: 2, borderRadius: radius.button, flexGrow: 1, flexBasis: 148, maxWidth: 320 },
  step: { flex: 1, minHeight: target.shootHeight, alignItems: 'center', justifyContent: 'center' },
  middle: { width: 48, borderLeftWidth: 1, borderRightWidth: 1, justifyContent: 'center' },
});
