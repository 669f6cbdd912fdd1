import { useTranslation } from 'react-i18next';
import { printLength } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { i18n } from '@/hooks/i18n/i18n';
import { toTheMark, type JobUnits } from '@/components/lengths/job-units';
import type { OutlineEditor } from './use-outline-editor';

interface OutlineNoticesProps {
  editor: OutlineEditor;
  units: JobUnits;
  may: boolean;
}

/** What stands in the way of the outline: that it crosses itself, misses closing, or that its steps do not come back. */
export function OutlineNotices({ editor, units, may }: OutlineNoticesProps) {
  const { t } = useTranslation('outline');
  const { state, draft, grades } = editor;
  switch (state.kind) {
    case 'empty':
      return null;
    case 'crosses':
      return (
        <Notice kind="mismatch" lead={t('state.crosses')}>
          {t('state.crossesHow')}
        </Notice>
      );
    case 'misses':
      return <Misclosure editor={editor} units={units} may={may} />;
    case 'strip':
      return (
        <Notice kind="plain" lead={t('state.strip')}>
          {draft.runs.length > 1 ? t('state.stripHow', { turned: degrees(state.turned) }) : undefined}
        </Notice>
      );
    case 'closes':
      if (grades.endsBy === 0) return null;
      return (
        <Notice
          kind="mismatch"
          lead={t(grades.endsBy > 0 ? 'state.stepsOpen_up' : 'state.stepsOpen_down', {
            by: toTheMark(Math.abs(grades.endsBy), units),
          })}
        >
          {t('state.stepsOpenHow')}
        </Notice>
      );
  }
}

const degrees = (value: number) => new Intl.NumberFormat(i18n.language, { maximumFractionDigits: 2 }).format(value);

/** Feet stay with their inches at the end of a line. */
const unbroken = (length: string) => length.replaceAll(' ', '\u00a0');

/** "run 6 is 22′ 0″, run 2 is 29′ 10″, or run 4 is 8′ 2″": every single run that closes it, and a button each. */
function Misclosure({ editor, units, may }: OutlineNoticesProps) {
  const { t } = useTranslation('outline');
  const { state, dispatch } = editor;
  if (state.kind !== 'misses') return null;
  const mends = state.mends.map((mend) => ({ ...mend, words: toTheMark(mend.length, units) }));
  const list = new Intl.ListFormat(i18n.language, { type: 'disjunction' }).format(
    mends.map(({ number, words }) => t('state.mend', { number, length: unbroken(words) })),
  );
  const [only] = mends;
  const sentence =
    only === undefined
      ? t('state.noMend')
      : mends.length === 1
        ? t('state.mendsOne', { number: only.number, length: unbroken(only.words) })
        : t('state.mendsMany', { list });
  return (
    <Notice
      kind="mismatch"
      lead={t('state.misses', { by: toTheMark(state.by, units) })}
      actions={
        may && mends.length > 0
          ? mends.map(({ runId, number, length, words }) => (
              <Button
                key={runId}
                label={t('state.use', { length: words })}
                spokenLabel={t('state.useSpoken', { length: words, number })}
                variant="quiet"
                size="small"
                onPress={() => dispatch({ type: 'mend', runId, entry: { text: printLength(length, units.style), kept: length } })}
              />
            ))
          : undefined
      }
    >
      {sentence}
    </Notice>
  );
}
