import { Pressable, StyleSheet, View } from 'react-native';
import { radius, space, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Icon } from './icons';
import { Body } from './text';

interface CheckBoxProps {
  label: string;
  /** A second line: who ticked it, what is missing. */
  note?: string;
  /** The note says what is missing rather than what was done. */
  lacking?: boolean;
  checked: boolean;
  onChange: (checked: boolean) => void;
  disabled?: boolean;
}

/** A box to tick with its label; Space or a press changes it. */
export function CheckBox({ label, note, lacking = false, checked, onChange, disabled = false }: CheckBoxProps) {
  const tokens = useTokens();
  const edge = checked ? tokens.on : lacking ? tokens.high : tokens.rule2;
  // Space belongs to a check box; react-native-web gives it to buttons alone. The type does not know keyboard events.
  const web = {
    onKeyDown: (event: { key: string; preventDefault(): void }) => {
      if (event.key !== ' ' || disabled) return;
      event.preventDefault();
      onChange(!checked);
    },
  };
  return (
    <Pressable
      {...web}
      role="checkbox"
      aria-checked={checked}
      aria-disabled={disabled}
      disabled={disabled}
      onPress={() => onChange(!checked)}
      style={styles.row}
    >
      <View style={[styles.box, { borderColor: edge, backgroundColor: checked ? tokens.on : tokens.paper }]}>
        {checked ? <Icon name="tick" size={20} tone="paper" /> : null}
      </View>
      <View style={styles.words}>
        <Body weight="semibold">{label}</Body>
        {note ? (
          <Body size="small" weight={lacking ? 'bold' : 'regular'} tone={lacking ? 'high' : 'ink2'}>
            {note}
          </Body>
        ) : null}
      </View>
    </Pressable>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', gap: space.m, minHeight: target.least, paddingVertical: space.xs },
  box: { width: 28, height: 28, borderWidth: 2, borderRadius: radius.key, alignItems: 'center', justifyContent: 'center' },
  words: { flex: 1 },
});
