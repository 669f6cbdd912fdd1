import { useTranslation } from 'react-i18next';
import { Pressable, StyleSheet, View } from 'react-native';
import { radius, space, target, type Tokens } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Label } from './text';

export type SavedState = 'on-phone' | 'sending' | 'on-server' | 'needs-you';

interface StatusPillProps {
  state: SavedState;
  /** How many things wait on this phone; said in the pill when above 0. */
  count?: number;
  /** Opens what it tells about. */
  onPress?: () => void;
}

const dotColour = (tokens: Tokens, state: SavedState): string =>
  ({ 'on-phone': tokens.caution, sending: tokens.low, 'on-server': tokens.on, 'needs-you': tokens.high })[state];

/** Where what was recorded now is: a dot and the word. A change is announced without interrupting. */
export function StatusPill({ state, count = 0, onPress }: StatusPillProps) {
  const tokens = useTokens();
  const { t } = useTranslation('common');
  const label =
    count > 0 && state === 'on-phone'
      ? t('saved.countOnPhone', { count })
      : count > 0 && state === 'needs-you'
        ? t('saved.countNeedsYou', { count })
        : t(`saved.${state}`);
  const pill = (
    <View style={[styles.pill, { backgroundColor: tokens.paper, borderColor: tokens.rule2 }]}>
      <View style={[styles.dot, state === 'sending' ? styles.hollow : null, dot(state, dotColour(tokens, state))]} />
      <View role="status">
        <Label weight="bold" tone="ink" numberOfLines={1}>
          {label}
        </Label>
      </View>
    </View>
  );
  if (!onPress) return pill;
  return (
    // A status inside gives a button no name, so it says its own.
    <Pressable role="button" aria-label={label} onPress={onPress} style={styles.press}>
      {pill}
    </Pressable>
  );
}

const dot = (state: SavedState, colour: string) =>
  state === 'sending' ? { borderColor: colour } : { backgroundColor: colour, borderRadius: state === 'needs-you' ? 1 : 5 };

const styles = StyleSheet.create({
  pill: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space.s,
    borderWidth: 1,
    borderRadius: radius.pill,
    paddingVertical: 3,
    paddingHorizontal: space.m,
  },
  dot: { width: 9, height: 9 },
  hollow: { borderWidth: 2, borderRadius: 5 },
  press: { minHeight: target.least, justifyContent: 'center' },
});
