import { Controller, useFormContext } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { FormLengthField } from '@/components/forms/form-length-field';
import { CheckBox } from '@/components/ui/check-box';
import { FieldPair } from '@/components/forms/field-pair';
import type { UnitStyle } from '@/shared/quantities';
import type { Surface } from '@/shared/rules';
import type { RulesForm } from './rule-drafts';

/** How far a surface may lie below and above plan grade. Belongs inside a form that holds `rules`. */
export function ToleranceFields({ surface, style }: { surface: Surface; style: UnitStyle }) {
  const { t } = useTranslation('jobs');
  const { control } = useFormContext<RulesForm>();
  return (
    <>
      <FieldPair>
        <FormLengthField
          control={control}
          name={`rules.${surface}.low`}
          label={t('rule.below')}
          hint={t('rule.belowHint')}
          style={style}
          sign="not-negative"
        />
        <FormLengthField
          control={control}
          name={`rules.${surface}.high`}
          label={t('rule.above')}
          hint={t('rule.aboveHint')}
          style={style}
          sign="not-negative"
        />
      </FieldPair>
      <Controller
        control={control}
        name={`rules.${surface}.decision`}
        render={({ field }) => (
          <CheckBox
            label={t('rule.guarded')}
            note={t('rule.guardedNote')}
            checked={field.value === 'guarded'}
            onChange={(checked) => field.onChange(checked ? 'guarded' : 'simple')}
          />
        )}
      />
    </>
  );
}
