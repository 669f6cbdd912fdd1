import { useFormContext, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { FieldPair } from '@/components/forms/field-pair';
import { FormChoice } from '@/components/forms/form-choice';
import { FormLengthField } from '@/components/forms/form-length-field';
import type { UnitStyle } from '@/shared/quantities';
import type { BedForm } from './rule-drafts';

/** What the first course may lie on. Belongs inside a form that holds `bed`. */
export function BedFields({ style }: { style: UnitStyle }) {
  const { t } = useTranslation('jobs');
  const { control } = useFormContext<BedForm>();
  const fraction = useWatch({ control, name: 'bed.fraction' });
  const fractions = [
    { value: '1', label: t('bed.full') },
    { value: '0.5', label: t('bed.faceShells') },
  ];
  // A rule made elsewhere may bed another share of the width; it is shown as it is until somebody picks.
  if (!fractions.some(({ value }) => value === fraction)) {
    fractions.push({ value: fraction, label: t('bed.share', { percent: Math.round(Number(fraction) * 100) }) });
  }
  return (
    <>
      <FormChoice
        control={control}
        name="bed.material"
        label={t('bed.material')}
        options={[
          { value: 'mortar', label: t('bed.mortar') },
          { value: 'foam', label: t('bed.foam') },
          { value: 'shim', label: t('bed.shim') },
        ]}
      />
      <FieldPair>
        <FormLengthField
          control={control}
          name="bed.least"
          label={t('bed.least')}
          hint={t('bed.leastHint')}
          style={style}
          sign="not-negative"
        />
        <FormLengthField control={control} name="bed.most" label={t('bed.most')} hint={t('bed.mostHint')} style={style} />
      </FieldPair>
      <FieldPair>
        <FormLengthField
          control={control}
          name="bed.nominal"
          label={t('bed.nominal')}
          hint={t('bed.nominalHint')}
          style={style}
          sign="not-negative"
        />
        <FormLengthField
          control={control}
          name="bed.grindMost"
          label={t('bed.grindMost')}
          hint={t('bed.grindMostHint')}
          style={style}
          sign="not-negative"
        />
      </FieldPair>
      <FormChoice control={control} name="bed.fraction" label={t('bed.fraction')} options={fractions} />
      <FormLengthField
        control={control}
        name="bed.courseHeight"
        label={t('bed.courseHeight')}
        hint={t('bed.courseHeightHint')}
        style={style}
        optional
      />
    </>
  );
}
