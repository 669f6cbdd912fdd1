import { useId, useRef, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View, type TextInput } from 'react-native';
import { formatLength } from '@/analysis';
import { printLength } from '@/components/lengths/print-length';
import { placeWords } from '@/components/results/place-words';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { Notice } from '@/components/ui/notice';
import { space } from '@/constants/theme';
import type { RoundTarget } from '@/shared/round/round-state';
import { earlierWords } from './earlier-words';
import { EntryPanel } from './entry-panel';
import { JumpSheet } from './jump-sheet';
import type { EntryRules } from './read-entry';
import { readingWords } from './record-words';
import { RecordRow } from './record-row';
import { refusalWords } from './refusal-words';
import { SetPanel } from './set-panel';
import { StationBar } from './station-bar';
import { StrikeSheet } from './strike-sheet';
import type { Shooting } from './use-shooting';
import { useShootKeys } from './use-shoot-keys';
import { VerdictCard } from './verdict-card';
import { markWords, verdictWords } from './verdict-words';

interface ShootingPanelProps {
  shooting: Shooting;
  target: RoundTarget;
  rules: EntryRules;
}

/** One station: what the rod should read, what it reads, what that means, and Record. */
export function ShootingPanel({ shooting, target, rules }: ShootingPanelProps) {
  const { t } = useTranslation('shoot');
  const refusalId = useId();
  const field = useRef<TextInput>(null);
  const [striking, setStriking] = useState(false);
  const { view, entry, key, mode, outShot, refusal, reading } = shooting;
  const { bundle } = view;
  const words = shooting.verdict && verdictWords(shooting.verdict, bundle);
  // Out of tolerance, recorded, and nothing keyed since: the rail is being moved.
  const moving = outShot !== null && mode === 'read' && reading.kind === 'wanting';
  const place = placeWords(bundle.footing, target);
  useShootKeys({
    onRecord: shooting.record,
    onStep: shooting.step,
    onInch: (by, foot) => key({ kind: foot ? 'foot' : 'inch', by }),
    onErase: () => key({ kind: 'erase' }),
    field,
    enabled: !striking && shooting.jump === null,
  });
  const settable = bundle.round.surface !== 'top';
  const refused = refusal !== null;
  return (
    <View style={styles.panel}>
      <StationBar
        place={place}
        gradeRod={gradeRodWords(shooting, rules)}
        earlier={earlierWords(target, shooting.lap, bundle.job)}
        now={moving && bundle.round.surface !== 'top' ? t(`out.${bundle.round.surface}`) : null}
        onStep={shooting.step}
      />
      <VerdictCard
        words={words}
        waiting={t(
          mode === 'set'
            ? 'verdict.waitingSet'
            : reading.kind === 'wanting' && reading.what === 'fraction'
              ? 'verdict.waitingFraction'
              : 'verdict.waiting',
        )}
        refusal={refusal && refusalWords(refusal, rules.style)}
        refusalId={refusalId}
      />
      {mode === 'set' ? (
        <SetOfTarget shooting={shooting} rules={rules} />
      ) : (
        <EntryPanel
          ref={field}
          entry={entry}
          rules={rules}
          onKey={key}
          onSubmit={shooting.record}
          refused={refused}
          refusalId={refusalId}
        />
      )}
      {moving ? (
        <View style={styles.row}>
          <Button label={t('nextStation')} size="large" onPress={shooting.goOn} />
          <Button label={t('shootAgain')} size="large" variant="primary" grow onPress={() => shooting.goTo(target.key)} />
        </View>
      ) : (
        <RecordRow
          label={t(mode === 'set' ? 'recordSet' : 'record')}
          onRecord={shooting.record}
          entry={entry}
          rules={rules}
          onKey={key}
          keys={mode === 'read'}
        />
      )}
      <View style={styles.row}>
        {settable ? (
          <Choice
            label={t('mode.label')}
            hideLabel
            options={(['read', 'set'] as const).map((value) => ({ value, label: t(`mode.${value}`) }))}
            value={mode}
            onChange={shooting.setMode}
            style={styles.half}
          />
        ) : null}
        <Button
          label={t('strike.button')}
          variant="plain"
          disabled={shooting.last === null}
          onPress={() => setStriking(true)}
          style={styles.half}
        />
      </View>
      <Questions shooting={shooting} place={place} striking={striking} onStruck={() => setStriking(false)} />
    </View>
  );
}

/** The grade rod in the rod's own unit, or that grade stands above the beam. */
function gradeRodWords({ rod }: Shooting, rules: EntryRules): string | null {
  return rod === null ? null : formatLength(rod, rules.style, rules.graduation);
}

function SetOfTarget({ shooting, rules }: { shooting: Shooting; rules: EntryRules }) {
  const { t } = useTranslation('shoot');
  const { rod, series, view } = shooting;
  if (rod === null || rod < 0 || rod > rules.rodLength) return <Notice kind="caution">{t('set.cannot')}</Notice>;
  const laser = view.bundle.lasers.find((one) => one.id === series?.setup?.laserId) ?? null;
  return (
    <SetPanel
      gradeRod={printLength(rod, rules.style)}
      laser={laser}
      style={rules.style}
      receiver={shooting.receiver}
      onReceiver={shooting.setReceiver}
    />
  );
}

interface QuestionsProps {
  shooting: Shooting;
  place: string;
  striking: boolean;
  onStruck: () => void;
}

/** What is asked before a record is written: about a jump, and why a shot is struck out. */
function Questions({ shooting, place, striking, onStruck }: QuestionsProps) {
  const { jump, last, view, rules } = shooting;
  const { job, footing } = view.bundle;
  if (jump && rules) {
    const reading = readingWords({ reading: jump.reading, style: rules.style });
    return <JumpSheet size={markWords(jump.size, job)} place={place} reading={reading} onAnswer={shooting.answerJump} />;
  }
  if (!striking || !last) return null;
  return (
    <StrikeSheet
      place={placeWords(footing, last)}
      reading={readingWords(last.record)}
      onStrike={(reason) => {
        onStruck();
        void shooting.strikeLast(reason);
      }}
      onClose={onStruck}
    />
  );
}

const styles = StyleSheet.create({
  panel: { gap: space.s },
  row: { flexDirection: 'row', gap: space.s },
  half: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minHeight: 54 },
});
