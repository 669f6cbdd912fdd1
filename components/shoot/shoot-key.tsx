import type { ReactNode } from 'react';
import { Pressable, StyleSheet, Text, type StyleProp, type ViewStyle } from 'react-native';
import { fonts } from '@/constants/fonts';
import { radius, target, typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { SpokenOnly } from './spoken-only';

interface ShootKeyProps {
  /** What a screen reader says. It is text in the key, not a label over it: what is drawn then need not repeat it. */
  label: string;
  onPress: () => void;
  /** Words or a drawn fraction; the drawn text takes `tone` from `pressed`. */
  children: ReactNode | ((tone: 'paper' | 'ink') => ReactNode);
  /** It is the one chosen. Absent: the key chooses nothing, it does something. */
  chosen?: boolean;
  size?: 'head' | 'title' | 'lead';
  style?: StyleProp<ViewStyle>;
}

/** One key of the shoot screen: tall and wide enough for a glove. */
export function ShootKey({ label, onPress, children, chosen, size = 'title', style }: ShootKeyProps) {
  const tokens = useTokens();
  const tone = chosen ? 'paper' : 'ink';
  const drawn = typeof children === 'function' ? children(tone) : children;
  return (
    <Pressable
      role="button"
      aria-pressed={chosen}
      onPress={onPress}
      style={({ pressed }) => [
        styles.key,
        {
          backgroundColor: chosen ? tokens.ink : pressed ? tokens.rule : tokens.paper,
          borderColor: chosen ? tokens.ink : tokens.rule2,
        },
        style,
      ]}
    >
      {drawn === label ? null : <SpokenOnly tone={tone}>{label}</SpokenOnly>}
      {typeof drawn === 'string' ? (
        <Text aria-hidden={drawn !== label} style={[styles.text, { color: tokens[tone], fontSize: typeSize[size] }]}>
          {drawn}
        </Text>
      ) : (
        drawn
      )}
    </Pressable>
  );
}

const styles = StyleSheet.create({
  key: {
    minHeight: target.shootHeight,
    borderWidth: 1,
    borderRadius: radius.key,
    alignItems: 'center',
    justifyContent: 'center',
    flexGrow: 1,
    flexShrink: 1,
    flexBasis: 0,
    minWidth: 0,
  },
  text: { fontFamily: fonts.figureBold, textAlign: 'center' },
});
