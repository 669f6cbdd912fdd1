import { useState, type ReactNode, type Ref } from 'react';
import { useTranslation } from 'react-i18next';
import { View, type StyleProp, type TextInput, type ViewStyle } from 'react-native';
import { AnalysisError } from '@/analysis';
import { TextField } from '@/components/ui/text-field';
import { Body } from '@/components/ui/text';
import { describeLengthRefusal } from './describe-length-refusal';
import { printLength } from './print-length';
import { readLength, styleOfText, type LengthRule } from './read-length';

export interface LengthFieldProps extends LengthRule {
  label: string;
  /** What is keyed, character for character: the field never rewrites it. */
  value: string;
  onChange: (text: string) => void;
  onBlur?: () => void;
  /** One line on what belongs here; unless said, how a length is keyed in this style. */
  hint?: string;
  /** A refusal from outside (a rule between two fields, the server): shown instead of the field's own. */
  error?: string;
  /** Empty is allowed. */
  optional?: boolean;
  hideLabel?: boolean;
  disabled?: boolean;
  autoFocus?: boolean;
  end?: ReactNode;
  ref?: Ref<TextInput>;
  boxStyle?: StyleProp<ViewStyle>;
}

/** The sentence for what was keyed, or null where it can be read. */
export function lengthRefusal(text: string, rule: LengthRule): string | null {
  try {
    readLength(text, rule);
    return null;
  } catch (error) {
    if (!(error instanceof AnalysisError)) throw error;
    return describeLengthRefusal(error, rule.style);
  }
}

/** Where the text said another unit than the field's, what it comes to in the field's. */
function readAs(text: string, rule: LengthRule): string | null {
  if (text.trim() === '' || styleOfText(text, rule) === rule.style || lengthRefusal(text, rule) !== null) return null;
  return printLength(readLength(text, rule), rule.style);
}

/**
 * A field for a length. It reads when it is left, says beside itself why it cannot read and what to key, and keeps what was
 * typed. `hint`, `error` and `value` work as in TextField.
 */
export function LengthField(props: LengthFieldProps) {
  const { t } = useTranslation(['errors', 'common']);
  const [left, setLeft] = useState<string | null>(null);
  const { ref, value, onBlur, style, graduation, sign, most, bareDecimal } = props;
  const rule: LengthRule = { style, graduation, sign, most, bareDecimal };
  const empty = value.trim() === '';
  // Judged once it was left, and again only when it changed: nobody is told off in mid-number.
  const own = left === value && !empty ? lengthRefusal(value, rule) : null;
  const other = left === value ? readAs(value, rule) : null;
  return (
    <View style={props.boxStyle}>
      <TextField
        label={props.optional ? t('errors:field.optional', { label: props.label }) : props.label}
        hint={props.hint ?? t(`errors:lengthHint.${style}`)}
        error={props.error ?? own ?? undefined}
        value={value}
        onChangeText={props.onChange}
        onBlur={() => {
          setLeft(value);
          onBlur?.();
        }}
        hideLabel={props.hideLabel}
        disabled={props.disabled}
        autoFocus={props.autoFocus}
        end={props.end}
        ref={ref}
        autoCapitalize="none"
        autoComplete="off"
        maxLength={64}
        figures
      />
      <View role="status">
        {other === null ? null : (
          <Body size="small" tone="ink2">
            {t('errors:length-read-as', { length: other })}
          </Body>
        )}
      </View>
    </View>
  );
}
