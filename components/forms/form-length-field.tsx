import { Controller, type Control, type FieldPathByValue, type FieldValues } from 'react-hook-form';
import { LengthField, lengthRefusal, type LengthFieldProps } from '@/components/lengths/length-field';

interface FormLengthFieldProps<Values extends FieldValues> extends Omit<
  LengthFieldProps,
  'value' | 'onChange' | 'onBlur' | 'error' | 'ref'
> {
  control: Control<Values>;
  /** The form keeps the text; `readLength` turns it into nanometres on submit. */
  name: FieldPathByValue<Values, string>;
}

/** A length in a form, kept as it was keyed. */
export function FormLengthField<Values extends FieldValues>({ control, name, ...field }: FormLengthFieldProps<Values>) {
  const validate = (text: string): true | string =>
    (field.optional && text.trim() === '') || (lengthRefusal(text, field) ?? true);
  return (
    <Controller
      control={control}
      name={name}
      rules={{ validate }}
      render={({ field: { ref, value, onChange, onBlur }, fieldState }) => (
        <LengthField {...field} ref={ref} value={value} onChange={onChange} onBlur={onBlur} error={fieldState.error?.message} />
      )}
    />
  );
}
