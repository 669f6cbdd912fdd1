import type { ComponentProps } from 'react';
import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { i18n } from '@/hooks/i18n/i18n';
import { TextField } from '@/components/ui/text-field';

type Passed = Omit<ComponentProps<typeof TextField>, 'value' | 'onChangeText' | 'onBlur' | 'error' | 'ref'>;

interface FormTextFieldProps<Values extends FieldValues> extends Passed {
  control: Control<Values>;
  name: FieldPath<Values>;
  optional?: boolean;
  /** A sentence to refuse with, or null. Asked after `optional`. */
  check?: (text: string) => string | null;
}

/** A text field of a form: needed unless it says otherwise, refused beside itself, and what was typed stays. */
export function FormTextField<Values extends FieldValues>(props: FormTextFieldProps<Values>) {
  const { control, name, optional = false, check, ...field } = props;
  const validate = (value: string): true | string => {
    if (value.trim() === '') return optional || i18n.t('errors:field.required');
    return check?.(value) ?? true;
  };
  return (
    <Controller
      control={control}
      name={name}
      rules={{ validate }}
      render={({ field: { ref, value, onChange, onBlur }, fieldState }) => (
        <TextField
          {...field}
          label={optional ? i18n.t('errors:field.optional', { label: field.label }) : field.label}
          ref={ref}
          value={value}
          onChangeText={onChange}
          onBlur={onBlur}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}
