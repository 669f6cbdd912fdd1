import { useId, useRef } from 'react';
import { Pressable, StyleSheet, View, type StyleProp, type ViewStyle } from 'react-native';
import { radius, space, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { FieldError } from './field-error';
import { Body, Label } from './text';

export interface ChoiceOption<Value extends string> {
  value: Value;
  label: string;
  /** A second line under the label; only drawn in rows. */
  note?: string;
}

interface ChoiceProps<Value extends string> {
  label: string;
  options: readonly ChoiceOption<Value>[];
  value: Value | null;
  onChange: (value: Value) => void;
  /** segments: side by side, for two to four short words. rows: one under the other. */
  layout?: 'segments' | 'rows';
  hideLabel?: boolean;
  hint?: string;
  error?: string;
  disabled?: boolean;
  style?: StyleProp<ViewStyle>;
}

const moves: Record<string, number> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };

/** One of several. A radio group: one stop for Tab, the arrows move and choose, Home and End go to the ends. */
export function Choice<Value extends string>({ layout = 'segments', ...props }: ChoiceProps<Value>) {
  const tokens = useTokens();
  const id = useId();
  const parts = useRef<(View | null)[]>([]);
  const chosen = props.options.findIndex((option) => option.value === props.value);
  const choose = (at: number) => {
    const option = props.options[(at + props.options.length) % props.options.length];
    if (!option || props.disabled) return;
    props.onChange(option.value);
    parts.current[props.options.indexOf(option)]?.focus();
  };
  const onKey = (event: { key: string; preventDefault(): void }, at: number) => {
    const ends: Record<string, number> = { ' ': at, Home: 0, End: props.options.length - 1 };
    const move = moves[event.key];
    const to = move !== undefined ? at + move : ends[event.key];
    if (to === undefined) return;
    event.preventDefault();
    choose(to);
  };
  // The web's own attributes, which react-native's types do not know.
  const web = { 'aria-describedby': props.error ? `${id}-error` : undefined, 'aria-invalid': props.error ? true : undefined };
  return (
    <View style={[styles.field, props.style]}>
      {props.hideLabel ? null : (
        <Label id={`${id}-label`} weight="semibold">
          {props.label}
        </Label>
      )}
      {props.hint ? (
        <Body size="small" tone="ink2">
          {props.hint}
        </Body>
      ) : null}
      <View
        role="radiogroup"
        aria-label={props.hideLabel ? props.label : undefined}
        aria-labelledby={props.hideLabel ? undefined : `${id}-label`}
        {...web}
        style={[
          layout === 'segments' ? styles.segments : styles.rows,
          layout === 'segments' ? { borderColor: tokens.rule2 } : null,
        ]}
      >
        {props.options.map((option, at) => (
          <Option
            key={option.value}
            ref={(node) => void (parts.current[at] = node)}
            option={option}
            checked={at === chosen}
            stop={at === Math.max(chosen, 0)}
            first={at === 0}
            last={at === props.options.length - 1}
            layout={layout}
            disabled={props.disabled ?? false}
            onPress={() => choose(at)}
            onKey={(event) => onKey(event, at)}
          />
        ))}
      </View>
      <FieldError id={`${id}-error`} message={props.error} />
    </View>
  );
}

interface OptionProps {
  option: ChoiceOption<string>;
  checked: boolean;
  /** Whether Tab stops here. */
  stop: boolean;
  first: boolean;
  last: boolean;
  layout: 'segments' | 'rows';
  disabled: boolean;
  onPress: () => void;
  onKey: (event: { key: string; preventDefault(): void }) => void;
  ref: (node: View | null) => void;
}

function Option({ option, checked, stop, first, last, layout, disabled, onPress, onKey, ref }: OptionProps) {
  const tokens = useTokens();
  const filled = checked && layout === 'segments';
  // Keyboard events reach the element on the web only; react-native's Pressable has no type for them.
  const web = { onKeyDown: onKey };
  return (
    <Pressable
      {...web}
      ref={ref}
      role="radio"
      aria-checked={checked}
      aria-disabled={disabled}
      tabIndex={stop ? 0 : -1}
      onPress={onPress}
      style={[
        layout === 'segments' ? styles.segment : styles.row,
        layout === 'segments' && !first ? { borderLeftWidth: 1, borderLeftColor: tokens.rule2 } : null,
        layout === 'segments' && first ? styles.leftEnd : null,
        layout === 'segments' && last ? styles.rightEnd : null,
        layout === 'rows' ? { borderColor: checked ? tokens.ink : tokens.rule2 } : null,
        { backgroundColor: filled ? tokens.ink : tokens.paper },
      ]}
    >
      {layout === 'rows' ? <Dot checked={checked} /> : null}
      <View style={styles.words}>
        <Label weight="bold" size="text" tone={filled ? 'paper' : 'ink'} align={layout === 'segments' ? 'center' : 'left'}>
          {option.label}
        </Label>
        {layout === 'rows' && option.note ? (
          <Body size="small" tone="ink2">
            {option.note}
          </Body>
        ) : null}
      </View>
    </Pressable>
  );
}

function Dot({ checked }: { checked: boolean }) {
  const tokens = useTokens();
  return (
    <View style={[styles.ring, { borderColor: checked ? tokens.ink : tokens.rule2 }]}>
      {checked ? <View style={[styles.dot, { backgroundColor: tokens.ink }]} /> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  field: { gap: space.xs },
  segments: { flexDirection: 'row', borderWidth: 2, borderRadius: radius.button },
  // The ends are rounded one by one: a clipped frame would cut off the ring of a focused segment.
  leftEnd: { borderTopLeftRadius: radius.key, borderBottomLeftRadius: radius.key },
  rightEnd: { borderTopRightRadius: radius.key, borderBottomRightRadius: radius.key },
  segment: {
    flexGrow: 1,
    flexShrink: 1,
    flexBasis: 0,
    minHeight: target.least,
    alignItems: 'center',
    justifyContent: 'center',
    paddingHorizontal: space.s,
  },
  rows: { gap: space.s },
  row: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space.m,
    borderWidth: 2,
    borderRadius: radius.button,
    minHeight: target.least,
    paddingVertical: space.s,
    paddingHorizontal: space.m,
  },
  words: { flexShrink: 1 },
  ring: { width: 22, height: 22, borderRadius: 11, borderWidth: 2, alignItems: 'center', justifyContent: 'center' },
  dot: { width: 10, height: 10, borderRadius: 5 },
});
