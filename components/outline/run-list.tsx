import { useEffect, useRef, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Pressable, StyleSheet, View } from 'react-native';
import { HeardOnly } from '@/components/ui/heard-only';
import { Body, Figure, Heading, Label } from '@/components/ui/text';
import { space, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { Footing } from '@/shared/api/footing-schemas';
import { toTheMark, type JobUnits } from '@/components/lengths/job-units';
import type { DraftRun } from './outline-draft';
import { RunEditor } from './run-editor';
import { lengthWords, sizeWords, stepWords, turnWords } from './run-words';
import type { OutlineEditor } from './use-outline-editor';

interface RunListProps {
  editor: OutlineEditor;
  footing: Footing;
  units: JobUnits;
  /** Whether whoever looks may change it. */
  may: boolean;
  /** The drawing where it has no place beside the list: it goes along with the run that is typed. */
  picture: ReactNode;
}

/** The runs in walking order; the one that is open is edited in its place. */
export function RunList({ editor, footing, units, may, picture }: RunListProps) {
  const { t } = useTranslation('outline');
  const tokens = useTokens();
  const { draft, dispatch, read } = editor;
  return (
    <View>
      <View style={[styles.head, { borderBottomColor: tokens.rule }]}>
        <Heading level={2}>{t('runs')}</Heading>
        <Label>{t('grade')}</Label>
      </View>
      <View role="list">
        {draft.runs.map((run, index) => (
          <View key={run.id} role="listitem">
            {may && draft.open === run.id ? (
              <RunEditor
                run={run}
                number={index + 1}
                last={index === draft.runs.length - 1}
                units={units}
                footing={footing}
                refusals={read.refusals}
                left={draft.left}
                dispatch={dispatch}
                onNext={editor.addRun}
                picture={picture}
              />
            ) : (
              <RunRow
                editor={editor}
                run={run}
                index={index}
                units={units}
                onPress={may ? () => dispatch({ type: 'open', runId: run.id }) : undefined}
              />
            )}
          </View>
        ))}
      </View>
    </View>
  );
}

interface RunRowProps {
  editor: OutlineEditor;
  run: DraftRun;
  index: number;
  units: JobUnits;
  onPress: (() => void) | undefined;
}

function RunRow({ editor, run, index, units, onPress }: RunRowProps) {
  const { t } = useTranslation('outline');
  const tokens = useTokens();
  const { draft, read, state, grades } = editor;
  const place = useRef<View>(null);
  const here = read.drawn[index] ?? null;
  const length = lengthWords(run, here, units);
  const turn = turnWords(run, index === draft.runs.length - 1, state);
  const start = grades.starts[index];
  const grade = start === undefined ? '' : toTheMark(start, units);
  const notes = here ? [...stepWords(here, units), ...sizeWords(here, units)] : [];
  const end = [grade, ...notes].filter((part) => part !== '').join(', ');
  const closed = draft.closed === run.id;
  // The editor that was here is gone and its focus with it: whoever works by keyboard goes on from this row.
  useEffect(() => {
    if (closed) place.current?.focus();
  }, [closed]);
  const inside = (
    <>
      <HeardOnly>{t('run.spoken', { number: index + 1, length, turn, grade: end })}</HeardOnly>
      <View aria-hidden style={styles.seen}>
        <Label style={styles.number}>{index + 1}</Label>
        <Figure size={here ? 'head' : 'text'} weight="bold" tone={here ? 'ink' : 'caution'} style={styles.length}>
          {length}
        </Figure>
        <Body tone="ink2" style={styles.turn}>
          {turn}
        </Body>
        <Figure align="right" style={styles.grade}>
          {end}
        </Figure>
      </View>
    </>
  );
  const box = [styles.row, { borderBottomColor: tokens.rule }];
  if (!onPress) return <View style={box}>{inside}</View>;
  return (
    <Pressable ref={place} role="button" aria-expanded={false} onPress={onPress} style={box}>
      {inside}
    </Pressable>
  );
}

const styles = StyleSheet.create({
  head: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', justifyContent: 'space-between', borderBottomWidth: 1 },
  row: { minHeight: 50, justifyContent: 'center', paddingVertical: space.s, borderBottomWidth: 1 },
  seen: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.s },
  number: { minWidth: 14 },
  length: { minWidth: 88, flexShrink: 1 },
  turn: { flexGrow: 1, flexShrink: 1, flexBasis: 80, minHeight: target.least / 2 },
  grade: { flexGrow: 1, flexShrink: 1, minWidth: 56 },
});
