import type { Dispatch } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { LengthField } from '@/components/lengths/length-field';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { Heading } from '@/components/ui/text';
import { space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { DraftRun, DraftStep, OutlineAction } from './outline-draft';
import { stepFieldOf } from './read-outline';
import type { JobUnits } from '@/components/lengths/job-units';

interface StepFieldsProps {
  run: DraftRun;
  step: DraftStep;
  number: number;
  units: JobUnits;
  /** The sentence for a refused field, once it is shown. */
  refusal: (field: string) => string | undefined;
  dispatch: Dispatch<OutlineAction>;
}

/** One step: the place where it is, how high, and which way. */
export function StepFields({ run, step, number, units, refusal, dispatch }: StepFieldsProps) {
  const { t } = useTranslation('outline');
  const tokens = useTokens();
  const field = (name: 'at' | 'by') => ({
    value: step[name].text,
    onChange: (text: string) => dispatch({ type: 'type-step', runId: run.id, stepId: step.id, field: name, text }),
    onBlur: () => dispatch({ type: 'leave', field: stepFieldOf(run.id, step.id, name) }),
    error: refusal(stepFieldOf(run.id, step.id, name)),
    style: units.style,
    sign: 'any' as const,
    bareDecimal: 'feet' as const,
  });
  return (
    <View style={[styles.step, { borderColor: tokens.rule }]} role="group" aria-label={t('edit.stepName', { number })}>
      <Heading level={3} size="text">
        {t('edit.stepName', { number })}
      </Heading>
      <View style={styles.pair}>
        <LengthField {...field('at')} label={t('edit.at')} boxStyle={styles.half} hint="" autoFocus={step.at.text === ''} />
        <LengthField {...field('by')} label={t('edit.by')} boxStyle={styles.half} hint="" />
      </View>
      <Choice
        label={t('edit.direction')}
        value={step.direction}
        onChange={(direction) => dispatch({ type: 'step-direction', runId: run.id, stepId: step.id, direction })}
        options={[
          { value: 'down', label: t('edit.down') },
          { value: 'up', label: t('edit.up') },
        ]}
      />
      <Button
        label={t('edit.removeStep', { number })}
        variant="quiet"
        size="small"
        onPress={() => dispatch({ type: 'remove-step', runId: run.id, stepId: step.id })}
      />
    </View>
  );
}

const styles = StyleSheet.create({
  step: { gap: space.s, borderTopWidth: 1, paddingTop: space.s },
  pair: { flexDirection: 'row', flexWrap: 'wrap', gap: space.m },
  half: { flexGrow: 1, flexShrink: 1, flexBasis: 130, minWidth: 0 },
});
