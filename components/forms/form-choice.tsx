import type { ComponentProps } from 'react';
import { Controller, type Control, type FieldPathByValue, type FieldValues } from 'react-hook-form';
import { Choice } from '@/components/ui/choice';

interface FormChoiceProps<Values extends FieldValues, Value extends string> extends Omit<
  ComponentProps<typeof Choice<Value>>,
  'value' | 'onChange' | 'error'
> {
  control: Control<Values>;
  name: FieldPathByValue<Values, Value>;
  /** After the form has taken the choice: for fields that follow from it. */
  onChosen?: (value: Value) => void;
}

/** One of several, in a form. */
export function FormChoice<Values extends FieldValues, Value extends string>(props: FormChoiceProps<Values, Value>) {
  const { control, name, onChosen, ...choice } = props;
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <Choice<Value>
          {...choice}
          value={field.value}
          onChange={(value) => {
            field.onChange(value);
            onChosen?.(value);
          }}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}
