import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { placeWords } from '@/components/results/place-words';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { space } from '@/constants/theme';
import { useOutbox } from '@/hooks/outbox/use-outbox';
import type { ReadyRound } from '@/hooks/round/use-round';
import { useWide } from '@/hooks/use-wide';
import { CheckPanel } from './check-panel';
import { LapEnd } from './lap-end';
import { LaserCard } from './laser-card';
import { NeedsSetup } from './needs-setup';
import { RoundStrip } from './round-strip';
import { ShootingPanel } from './shooting-panel';
import { ShotNotes } from './shot-notes';
import { backsightMark } from './use-benchmark-check';
import { useShooting, type Shooting } from './use-shooting';

/** The round at hand: on a phone one column without scrolling, from 900 px the strip and the notes beside the keys. */
export function ShootBody({ roundId, view, at }: { roundId: string; view: ReadyRound; at: string | null }) {
  const wide = useWide();
  const shooting = useShooting(roundId, view, at);
  const [checking, setChecking] = useState(false);
  const { series, target } = shooting;
  const mark = backsightMark(view, series);
  const laser =
    series && series.hi !== null ? (
      <LaserCard
        series={series}
        job={view.bundle.job}
        checking={checking}
        onCheck={mark && !checking ? () => setChecking(true) : undefined}
      />
    ) : null;
  const strip = <RoundStrip view={view} target={checking ? null : target} verdict={shooting.verdict} height={wide ? 170 : 74} />;
  const work = <Work shooting={shooting} checking={checking} onCheck={setChecking} />;
  if (!wide) {
    return (
      <View style={styles.narrow}>
        <Warnings view={view} />
        {laser}
        {strip}
        {work}
      </View>
    );
  }
  return (
    <View style={styles.wide}>
      <View style={styles.notes}>
        <Warnings view={view} />
        {laser}
        <Card>{strip}</Card>
        <ShotNotes view={view} currentKey={target?.key ?? null} onPick={shooting.goTo} />
      </View>
      <View style={styles.keys}>{work}</View>
    </View>
  );
}

interface WorkProps {
  shooting: Shooting;
  checking: boolean;
  onCheck: (checking: boolean) => void;
}

/** The one thing to do now: set up, read the benchmark, shoot, or go on from a lap that is done. */
function Work({ shooting, checking, onCheck }: WorkProps) {
  const { t } = useTranslation('shoot');
  const { view, series, rules, target, recorder } = shooting;
  const { footing } = view.bundle;
  if (view.state.targets.length === 0) {
    const action = (
      <Button
        label={t('noTargets.button')}
        variant="primary"
        href={{ pathname: '/footings/[footingId]/stations', params: { footingId: footing.id } }}
      />
    );
    return (
      <EmptyState title={t('noTargets.title')} action={action}>
        {t('noTargets.how')}
      </EmptyState>
    );
  }
  if (!series || series.hi === null || !rules) return <NeedsSetup shooting={shooting} />;
  const mark = backsightMark(view, series);
  if (checking && mark) {
    const parts = { view, series: { ...series, hi: series.hi }, rules, recorder, benchmark: mark };
    return <CheckPanel {...parts} onDone={() => onCheck(false)} />;
  }
  if (target === null) return <LapEnd shooting={shooting} onCheck={() => onCheck(true)} />;
  return <ShootingPanel shooting={shooting} target={target} rules={rules} />;
}

function Warnings({ view }: { view: ReadyRound }) {
  const { t } = useTranslation('shoot');
  const { broken } = useOutbox();
  const { disagreements, targets } = view.state;
  const places = disagreements.flatMap(({ key }) => {
    const target = targets.find((one) => one.key === key);
    return target ? [placeWords(view.bundle.footing, target)] : [];
  });
  return (
    <>
      {broken ? <Notice kind="refusal">{t('broken')}</Notice> : null}
      {places.length > 0 ? (
        <Notice kind="caution" announce>
          {t('disagree', { count: places.length, places: places.join(', ') })}
        </Notice>
      ) : null}
    </>
  );
}

const styles = StyleSheet.create({
  narrow: { gap: space.s },
  wide: { flexDirection: 'row', alignItems: 'flex-start', gap: space.l },
  notes: { flex: 1.2, minWidth: 0, gap: space.l },
  keys: { flex: 1, minWidth: 400, maxWidth: 480 },
});
