import { Link, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import { Pressable, StyleSheet, Text, View, type StyleProp, type TextStyle, type ViewStyle } from 'react-native';
import { fonts } from '@/constants/fonts';
import { radius, space, target, typeSize, type Tokens } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';

export type ButtonVariant = 'primary' | 'outline' | 'plain' | 'quiet';

interface ButtonProps {
  /** What is read and what a screen reader says. */
  label: string;
  /** What a screen reader says instead, where the drawn label is short ("Use 22′ 0″" for run 6). */
  spokenLabel?: string;
  /** primary: filled, one a screen. outline: heavy ink border. plain: thin border. quiet: an underlined link. */
  variant?: ButtonVariant;
  /** 48, 52 or 60 high. */
  size?: 'small' | 'normal' | 'large';
  onPress?: () => void;
  /** Goes somewhere instead of doing something: drawn the same, and a real link. */
  href?: Href;
  disabled?: boolean;
  /** At work: says so, stays in place and takes no second press. */
  busy?: boolean;
  /** Takes the room that is left in its row. */
  grow?: boolean;
  /** Drawn before the label. */
  icon?: ReactNode;
  style?: StyleProp<ViewStyle>;
}

const heights = { small: target.least, normal: 52, large: 60 } as const;
const labelSizes = { small: typeSize.text, normal: typeSize.lead, large: typeSize.head } as const;

function colours(tokens: Tokens, variant: ButtonVariant, disabled: boolean, pressed: boolean) {
  const text = disabled ? tokens.ink2 : variant === 'primary' ? tokens.paper : tokens.ink;
  if (variant === 'quiet') return { text, ground: 'transparent', border: 'transparent' };
  if (variant === 'primary') {
    const ground = disabled ? tokens.rule : pressed ? tokens.ink2 : tokens.ink;
    return { text, ground, border: ground };
  }
  const border = variant === 'outline' && !disabled ? tokens.ink : tokens.rule2;
  const ground = pressed ? tokens.rule : variant === 'plain' ? tokens.paper : 'transparent';
  return { text, ground, border };
}

/** A button, or with `href` a link that looks like one. Never under 48 high. */
export function Button({ variant = 'outline', size = 'normal', disabled = false, busy = false, ...props }: ButtonProps) {
  const tokens = useTokens();
  const box = (pressed: boolean): ViewStyle => {
    const { ground, border } = colours(tokens, variant, disabled, pressed);
    return StyleSheet.flatten([
      styles.box,
      variant === 'quiet' ? styles.quiet : { paddingHorizontal: space.l },
      { minHeight: heights[size], backgroundColor: ground, borderColor: border, borderWidth: variant === 'quiet' ? 0 : 2 },
      props.grow ? styles.grow : null,
      props.style,
    ]);
  };
  const label: TextStyle = {
    fontFamily: variant === 'quiet' ? fonts.figure : fonts.figureBold,
    fontSize: labelSizes[size],
    color: colours(tokens, variant, disabled, false).text,
    textDecorationLine: variant === 'quiet' ? 'underline' : 'none',
  };
  const inside = (
    <View style={styles.inside}>
      {props.icon}
      <Text style={[styles.label, label]}>{props.label}</Text>
    </View>
  );
  if (props.href !== undefined) {
    return (
      <Link href={props.href} asChild>
        <Pressable role="link" aria-label={props.spokenLabel} style={box(false)}>
          {inside}
        </Pressable>
      </Link>
    );
  }
  return (
    <Pressable
      role="button"
      aria-label={props.spokenLabel}
      aria-busy={busy}
      aria-disabled={disabled || busy}
      disabled={disabled || busy}
      onPress={props.onPress}
      style={({ pressed }) => box(pressed)}
    >
      {inside}
    </Pressable>
  );
}

const styles = StyleSheet.create({
  box: { borderRadius: radius.button, alignItems: 'center', justifyContent: 'center', paddingVertical: space.xs },
  quiet: { minWidth: target.least },
  grow: { flexGrow: 1, flexShrink: 1 },
  inside: { flexDirection: 'row', alignItems: 'center', gap: space.s },
  label: { textAlign: 'center', lineHeight: 22 },
});
