import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { AnalysisError, diagonals, type Diagonal, type Nm } from '@/analysis';
import { LengthField } from '@/components/lengths/length-field';
import { readLength } from '@/components/lengths/read-length';
import { Card } from '@/components/ui/card';
import { ListRow } from '@/components/ui/list-row';
import { Body, Figure, Label } from '@/components/ui/text';
import { space } from '@/constants/theme';
import { i18n } from '@/hooks/i18n/i18n';
import { toTheMark, type JobUnits } from '@/components/lengths/job-units';
import type { OutlineEditor } from './use-outline-editor';

/** An outline of many corners has more diagonals than anybody tapes: the longest show the most. */
const MOST_DIAGONALS = 6;
/** 1 ft² = 0.3048² m² exactly. */
const SQUARE_METRES_PER_SQUARE_FOOT = 0.092_903_04;

/** Square metres as the job says areas. */
function areaWords(squareMetres: number, { style }: JobUnits): string {
  const metric = style === 'metric';
  const area = new Intl.NumberFormat(i18n.language, { maximumFractionDigits: metric ? 2 : 1 }).format(
    metric ? squareMetres : squareMetres / SQUARE_METRES_PER_SQUARE_FOOT,
  );
  return i18n.t(metric ? 'outline:measure.squareMetres' : 'outline:measure.squareFeet', { area });
}

/** What the outline measures: perimeter, area, and its diagonals to compare with the tape. */
export function OutlineMeasures({ editor, units }: { editor: OutlineEditor; units: JobUnits }) {
  const { t } = useTranslation('outline');
  const { state, read } = editor;
  const [open, setOpen] = useState<string | null>(null);
  if (state.kind === 'empty' || state.kind === 'crosses') return null;
  const across =
    state.kind === 'closes'
      ? diagonals(read.drawn)
          .sort((p, q) => q.length - p.length)
          .slice(0, MOST_DIAGONALS)
      : [];
  return (
    <Card title={t('measure.title')} note={state.kind === 'closes' ? t('state.closes') : undefined}>
      <Measure
        label={t(state.kind === 'strip' ? 'measure.length' : 'measure.perimeter')}
        value={toTheMark(state.traced.perimeter, units)}
      />
      {state.kind === 'closes' ? <Measure label={t('measure.area')} value={areaWords(state.traced.area, units)} /> : null}
      {across.length > 0 ? <Label weight="semibold">{t('measure.diagonals')}</Label> : null}
      {across.map((diagonal, index) => {
        const name = `${diagonal.from}-${diagonal.to}`;
        const length = toTheMark(diagonal.length, units);
        return (
          <View key={name}>
            <ListRow
              title={t('measure.diagonal', { from: diagonal.from, to: diagonal.to })}
              end={length}
              onPress={() => setOpen(open === name ? null : name)}
              last={index === across.length - 1}
            />
            {open === name ? <TapedDiagonal diagonal={diagonal} units={units} /> : null}
          </View>
        );
      })}
    </Card>
  );
}

function Measure({ label, value }: { label: string; value: string }) {
  return (
    <View style={styles.measure}>
      <Body>{label}</Body>
      <Figure align="right">{value}</Figure>
    </View>
  );
}

/** Taped less computed, whole nm; null while what is typed does not read. */
function difference(text: string, diagonal: Diagonal, { style }: JobUnits): Nm | null {
  try {
    return readLength(text, { style, bareDecimal: 'feet' }) - diagonal.length;
  } catch (error) {
    if (error instanceof AnalysisError) return null; // the field itself says what does not read
    throw error;
  }
}

function TapedDiagonal({ diagonal, units }: { diagonal: Diagonal; units: JobUnits }) {
  const { t } = useTranslation('outline');
  const [text, setText] = useState('');
  const off = difference(text, diagonal, units);
  const words =
    off === null
      ? null
      : Math.abs(off) < units.graduation
        ? t('measure.tapedAgrees')
        : t(off > 0 ? 'measure.tapedLong' : 'measure.tapedShort', { by: toTheMark(Math.abs(off), units) });
  return (
    <View style={styles.taped}>
      <LengthField
        label={t('measure.taped', { from: diagonal.from, to: diagonal.to })}
        hint={t('measure.tapedHint')}
        value={text}
        onChange={setText}
        style={units.style}
        bareDecimal="feet"
        autoFocus
      />
      <View role="status">{words ? <Body>{words}</Body> : null}</View>
    </View>
  );
}

const styles = StyleSheet.create({
  measure: { flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', columnGap: space.m },
  taped: { gap: space.s, paddingVertical: space.s },
});
