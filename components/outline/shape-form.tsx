import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { v7 as newId } from 'uuid';
import { AnalysisError } from '@/analysis';
import { LengthField } from '@/components/lengths/length-field';
import { printLength } from '@/components/lengths/print-length';
import { readLength } from '@/components/lengths/read-length';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Choice } from '@/components/ui/choice';
import { Body } from '@/components/ui/text';
import { space } from '@/constants/theme';
import type { JobUnits } from '@/components/lengths/job-units';
import { newRun, type DraftRun } from './outline-draft';
import { outlineRefusal } from './outline-refusal';
import { READY_SHAPES, SHAPE_FIELDS, shapeRuns, type ReadyShape, type ShapeField, type ShapeSizes } from './ready-shapes';

interface ShapeFormProps {
  units: JobUnits;
  /** Runs are there already, and would be replaced. */
  replaces: boolean;
  onFill: (runs: DraftRun[]) => void;
  onCancel: () => void;
}

type Texts = Partial<Record<ShapeField, string>>;

/** The shape's runs, or the field that does not let it be and why. */
function readShape(
  shape: ReadyShape,
  texts: Texts,
  { style }: JobUnits,
): DraftRun[] | { field: ShapeField; error: AnalysisError } {
  let reading: ShapeField = 'length';
  try {
    const sizes: ShapeSizes = {};
    for (const field of SHAPE_FIELDS[shape]) {
      reading = field;
      sizes[field] = readLength(texts[field] ?? '', { style, sign: 'any', bareDecimal: 'feet' });
    }
    return shapeRuns(shape, sizes).map(({ length, way }) => ({
      ...newRun(newId()),
      length: { text: printLength(length, style), kept: length },
      way,
    }));
  } catch (error) {
    if (!(error instanceof AnalysisError)) throw error;
    const said = SHAPE_FIELDS[shape].find((field) => field === error.details.field);
    return { field: said ?? reading, error };
  }
}

/** Fills in the runs of a rectangle, L, U, T or strip from a few dimensions. */
export function ShapeForm({ units, replaces, onFill, onCancel }: ShapeFormProps) {
  const { t } = useTranslation(['outline', 'common']);
  const [shape, setShape] = useState<ReadyShape>('rectangle');
  const [texts, setTexts] = useState<Texts>({});
  const [refused, setRefused] = useState<{ field: ShapeField; sentence: string } | null>(null);
  const fill = () => {
    const read = readShape(shape, texts, units);
    if (Array.isArray(read)) onFill(read);
    else setRefused({ field: read.field, sentence: outlineRefusal(read.error, units.style) });
  };
  const type = (field: ShapeField, text: string) => {
    setTexts({ ...texts, [field]: text });
    setRefused(null);
  };
  const fields: readonly ShapeField[] = SHAPE_FIELDS[shape];
  return (
    <Card title={t('shapes.title')}>
      <Choice
        label={t('shapes.which')}
        layout="rows"
        value={shape}
        onChange={(chosen) => {
          setShape(chosen);
          setRefused(null);
        }}
        options={READY_SHAPES.map((value) => ({ value, label: t(`shapes.${value}`), note: t(`shapes.how.${value}`) }))}
      />
      <View style={styles.fields}>
        {fields.map((field) => (
          <LengthField
            key={field}
            label={t(shape === 't' && field === 'depth' ? 'shapes.tDepth' : `shapes.${field}`)}
            hint=""
            boxStyle={styles.field}
            value={texts[field] ?? ''}
            onChange={(text) => type(field, text)}
            error={refused?.field === field ? refused.sentence : undefined}
            style={units.style}
            sign="any"
            bareDecimal="feet"
          />
        ))}
      </View>
      {replaces ? <Body size="small">{t('shapes.replaces')}</Body> : null}
      <View style={styles.buttons}>
        <Button label={t('shapes.fill')} onPress={fill} grow />
        <Button label={t('common:action.cancel')} variant="plain" onPress={onCancel} />
      </View>
    </Card>
  );
}

const styles = StyleSheet.create({
  fields: { flexDirection: 'row', flexWrap: 'wrap', gap: space.m },
  field: { flexGrow: 1, flexShrink: 1, flexBasis: 220, minWidth: 0 },
  buttons: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
});
