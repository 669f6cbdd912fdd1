import { useState, type Dispatch, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { v7 as newId } from 'uuid';
import type { AnalysisError, Nm } from '@/analysis';
import { LengthField } from '@/components/lengths/length-field';
import { printLength } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { CheckBox } from '@/components/ui/check-box';
import { Choice } from '@/components/ui/choice';
import { Heading } from '@/components/ui/text';
import { TextField } from '@/components/ui/text-field';
import { radius, space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { JobUnits } from '@/components/lengths/job-units';
import type { DraftRun, OutlineAction } from './outline-draft';
import { outlineRefusal } from './outline-refusal';
import { fieldOf } from './read-outline';
import { StepFields } from './step-fields';

export interface RunEditorProps {
  run: DraftRun;
  number: number;
  last: boolean;
  units: JobUnits;
  /** The footing's own width and thickness, which an empty field takes. */
  footing: { width: Nm; thickness: Nm };
  refusals: Readonly<Record<string, AnalysisError>>;
  left: readonly string[];
  dispatch: Dispatch<OutlineAction>;
  onNext: () => void;
  /** Drawn above the fields, so that it grows in sight of whoever types. */
  picture: ReactNode;
}

/** A run open for editing, in its place in the list. */
export function RunEditor({ run, number, last, units, refusals, left, dispatch, ...props }: RunEditorProps) {
  const { t } = useTranslation('outline');
  const tokens = useTokens();
  const refusal = (field: string) => {
    const error = refusals[field];
    return error && left.includes(field) ? outlineRefusal(error, units.style) : undefined;
  };
  const angle = fieldOf(run.id, 'angle');
  return (
    <View
      role="group"
      aria-label={t('run.name', { number })}
      style={[styles.box, { backgroundColor: tokens.paper, borderColor: tokens.ink }]}
    >
      <Heading level={3}>{t('run.name', { number })}</Heading>
      {props.picture}
      <LengthField
        label={t('edit.length', { number })}
        hint={t('edit.lengthHint')}
        value={run.length.text}
        onChange={(text) => dispatch({ type: 'type-length', runId: run.id, field: 'length', text })}
        onBlur={() => dispatch({ type: 'leave', field: fieldOf(run.id, 'length') })}
        error={refusal(fieldOf(run.id, 'length'))}
        style={units.style}
        sign="any"
        bareDecimal="feet"
        autoFocus
      />
      <View style={styles.row}>
        <Choice
          label={t('edit.turn')}
          style={styles.turn}
          value={run.way}
          onChange={(way) => dispatch({ type: 'turn', runId: run.id, way })}
          options={[
            { value: 'right', label: t('edit.right') },
            { value: 'left', label: t('edit.left') },
            { value: 'straight', label: t('edit.straight') },
          ]}
        />
        {run.way === 'straight' ? null : (
          <TextField
            label={t('edit.angle')}
            style={styles.angle}
            value={run.angle}
            onChangeText={(text) => dispatch({ type: 'type-angle', runId: run.id, text })}
            onBlur={() => dispatch({ type: 'leave', field: angle })}
            error={refusal(angle)}
            inputMode="decimal"
            autoComplete="off"
            maxLength={12}
            figures
          />
        )}
      </View>
      <OwnSizes run={run} units={units} footing={props.footing} refusal={refusal} dispatch={dispatch} />
      {run.steps.map((step, index) => (
        <StepFields key={step.id} run={run} step={step} number={index + 1} units={units} refusal={refusal} dispatch={dispatch} />
      ))}
      <View style={styles.row}>
        <Button
          label={t('edit.addStep')}
          variant="plain"
          size="small"
          onPress={() => dispatch({ type: 'add-step', runId: run.id, id: newId() })}
        />
        <Button
          label={t('edit.remove', { number })}
          variant="quiet"
          size="small"
          onPress={() => dispatch({ type: 'remove-run', runId: run.id })}
        />
      </View>
      <View style={styles.row}>
        <Button label={t('edit.done', { number })} grow onPress={() => dispatch({ type: 'open', runId: null })} />
        {last ? <Button label={t('edit.next')} grow onPress={props.onNext} /> : null}
      </View>
    </View>
  );
}

interface OwnSizesProps extends Pick<RunEditorProps, 'run' | 'units' | 'footing' | 'dispatch'> {
  refusal: (field: string) => string | undefined;
}

/** Width and thickness of the run where they are not the footing's. */
function OwnSizes({ run, units, footing, refusal, dispatch }: OwnSizesProps) {
  const { t } = useTranslation('outline');
  const [asked, setAsked] = useState(run.width.text !== '' || run.thickness.text !== '');
  const change = (on: boolean) => {
    setAsked(on);
    if (on) return;
    for (const field of ['width', 'thickness'] as const) dispatch({ type: 'type-length', runId: run.id, field, text: '' });
  };
  return (
    <>
      <CheckBox label={t('edit.different')} checked={asked} onChange={change} />
      {asked ? (
        <View style={styles.row}>
          {(['width', 'thickness'] as const).map((field) => (
            <LengthField
              key={field}
              label={t(`edit.${field}`)}
              hint={t('edit.own', { size: printLength(footing[field], units.style) })}
              boxStyle={styles.half}
              value={run[field].text}
              onChange={(text) => dispatch({ type: 'type-length', runId: run.id, field, text })}
              onBlur={() => dispatch({ type: 'leave', field: fieldOf(run.id, field) })}
              error={refusal(fieldOf(run.id, field))}
              style={units.style}
              sign="any"
              bareDecimal="feet"
            />
          ))}
        </View>
      ) : null}
    </>
  );
}

const styles = StyleSheet.create({
  box: { borderWidth: 2, borderRadius: radius.card, padding: space.m, gap: space.m, marginVertical: space.s },
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-start', gap: space.m },
  turn: { flexGrow: 1, flexShrink: 1, flexBasis: 220 },
  angle: { flexGrow: 1, flexShrink: 1, flexBasis: 84, minWidth: 0 },
  half: { flexGrow: 1, flexShrink: 1, flexBasis: 150, minWidth: 0 },
});
