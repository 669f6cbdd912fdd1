import { useId, useRef, useState, type ReactNode, type Ref } from 'react';
import { StyleSheet, Text, TextInput, View, type StyleProp, type TextInputProps, type ViewStyle } from 'react-native';
import { fonts } from '@/constants/fonts';
import { radius, space, target, typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { FieldError } from './field-error';
import { Body } from './text';

type Passed = Pick<
  TextInputProps,
  | 'value'
  | 'onChangeText'
  | 'onBlur'
  | 'onFocus'
  | 'onSubmitEditing'
  | 'autoComplete'
  | 'autoCapitalize'
  | 'autoFocus'
  | 'inputMode'
  | 'enterKeyHint'
  | 'maxLength'
  | 'multiline'
  | 'secureTextEntry'
  | 'placeholder'
>;

interface TextFieldProps extends Passed {
  label: string;
  /** One line on what belongs here, before it is wrong: "feet and inches, such as 44 0". */
  hint?: string;
  /** Why it was refused and what to do. What was typed stays. */
  error?: string;
  /** Drawn at the end, inside the border: a unit, a button. */
  end?: ReactNode;
  /** Numbers are set in the narrow face. */
  figures?: boolean;
  /** The label is for a screen reader only, where a table's heading already says it. */
  hideLabel?: boolean;
  disabled?: boolean;
  ref?: Ref<TextInput>;
  style?: StyleProp<ViewStyle>;
}

/** A labelled field with its hint and its refusal beside it. */
export function TextField({ label, hint, error, end, figures, hideLabel, disabled, ref, style, ...input }: TextFieldProps) {
  const tokens = useTokens();
  const id = useId();
  const inner = useRef<TextInput | null>(null);
  const [focused, setFocused] = useState(false);
  const described = [hint ? `${id}-hint` : null, error ? `${id}-error` : null].filter((part) => part !== null).join(' ');
  const keep = (node: TextInput | null) => {
    inner.current = node;
    if (typeof ref === 'function') ref(node);
    else if (ref) ref.current = node;
  };
  const border = error ? tokens.caution : focused ? tokens.ink : tokens.rule2;
  // The web's own attributes, which react-native's types do not know.
  const web = { 'aria-describedby': described || undefined, 'aria-invalid': error ? true : undefined };
  return (
    <View style={[styles.field, style]}>
      {hideLabel ? null : (
        <Text
          id={`${id}-label`}
          style={[styles.label, { color: tokens.ink2 }]}
          onPress={() => inner.current?.focus()}
          suppressHighlighting
        >
          {label}
        </Text>
      )}
      {hint ? (
        <Body id={`${id}-hint`} size="small" tone="ink2">
          {hint}
        </Body>
      ) : null}
      <View style={[styles.box, { borderColor: border, backgroundColor: tokens.paper }, error || focused ? styles.heavy : null]}>
        <TextInput
          {...input}
          {...web}
          ref={keep}
          // Beside the visible label too: where that is scrolled away, checkers that look at the glass still find a name.
          aria-label={label}
          aria-labelledby={hideLabel ? undefined : `${id}-label`}
          aria-disabled={disabled}
          editable={!disabled}
          onFocus={(event) => {
            setFocused(true);
            input.onFocus?.(event);
          }}
          onBlur={(event) => {
            setFocused(false);
            input.onBlur?.(event);
          }}
          placeholderTextColor={tokens.ink2}
          style={[
            styles.input,
            { color: tokens.ink, fontFamily: figures ? fonts.figure : fonts.text },
            input.multiline ? styles.many : null,
          ]}
        />
        {end}
      </View>
      <FieldError id={`${id}-error`} message={error} />
    </View>
  );
}

const styles = StyleSheet.create({
  field: { gap: space.xs },
  label: { fontFamily: fonts.figure, fontSize: typeSize.small, lineHeight: 20 },
  box: {
    flexDirection: 'row',
    alignItems: 'center',
    borderWidth: 1,
    borderRadius: radius.key,
    margin: 1,
    paddingRight: space.xs,
  },
  heavy: { borderWidth: 2, margin: 0 },
  input: { flex: 1, minWidth: 0, minHeight: target.least, paddingHorizontal: space.m, fontSize: typeSize.lead },
  many: { minHeight: 96, paddingVertical: space.m, textAlignVertical: 'top' },
});
