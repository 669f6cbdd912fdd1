import { useRef, useState } from 'react';
import { AnalysisError, type Nm, type PlanPoint } from '@/analysis';
import { describeLengthRefusal } from '@/components/lengths/describe-length-refusal';
import { lengthRefusal } from '@/components/lengths/length-field';
import { printRound } from '@/components/lengths/print-length';
import { readLength, type LengthRule } from '@/components/lengths/read-length';
import { keyedText, readEntry, type EntryReading, type EntryRules } from '@/components/shoot/read-entry';
import { keyEntry, startEntry, type EntryAction, type ReadingEntry } from '@/components/shoot/reading-entry';
import { refusalWords } from '@/components/shoot/refusal-words';
import { i18n } from '@/hooks/i18n/i18n';
import { usualCheckLimit } from '@/hooks/round/record-drafts';
import { useRecorder } from '@/hooks/round/use-recorder';
import type { ReadyRound } from '@/hooks/round/use-round';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import { readingGraduation } from '@/shared/round/reading-graduation';
import type { RoundState } from '@/shared/round/round-state';

export interface Picked {
  laserId: string | null;
  rodId: string | null;
  benchmarkId: string | null;
}

/** What is refused, and beside which field its sentence stands. */
export interface SetupRefusal {
  where: 'laserId' | 'rodId' | 'benchmarkId' | 'distance' | 'reading' | 'keeping';
  sentence: string;
}

const only = <Item extends { id: string }>(items: readonly Item[]): string | null =>
  items.length === 1 ? (items[0]?.id ?? null) : null;

/** What the round's last setup had, else the only one that there is. */
function usualPick({ lasers, rods, benchmarks, job }: RoundBundle, state: RoundState): Picked {
  const last = state.series.at(-1);
  const known = <Item extends { id: string }>(items: readonly Item[], id: string | undefined) =>
    items.some((item) => item.id === id) ? (id ?? null) : null;
  return {
    laserId: known(lasers, last?.setup?.laserId) ?? only(lasers),
    rodId: known(rods, last?.record.rodId) ?? only(rods) ?? only(rods.filter((rod) => rod.style === job.unitStyle)),
    benchmarkId: only(benchmarks),
  };
}

/** A rod as text is read off it. */
function rulesOf(bundle: RoundBundle, rodId: string | null): EntryRules | null {
  const rod = bundle.rods.find(({ id }) => id === rodId);
  return rod ? { style: rod.style, graduation: readingGraduation(bundle.job, rod), rodLength: rod.length } : null;
}

function readingRefusal(reading: Exclude<EntryReading, { kind: 'reading' }>, rules: EntryRules): string {
  if (reading.kind === 'wanting') {
    const nothing = reading.what === 'reading' || reading.what === 'feet';
    return nothing ? i18n.t('setup:backsight.wanting') : refusalWords(reading, rules.style);
  }
  const { error } = reading;
  if (error.code === 'length-negative') return i18n.t('setup:backsight.upright');
  if (error.code === 'reading-longer-than-rod') {
    return i18n.t('setup:backsight.longerThanRod', { length: printRound(rules.rodLength, rules.style) });
  }
  return describeLengthRefusal(error, rules.style);
}

/** Null when left empty. @throws AnalysisError as `readLength` */
const optionalLength = (text: string, rule: LengthRule): Nm | null => (text.trim() === '' ? null : readLength(text, rule));

/** Setting the laser up, from picking it to the height of instrument. Nothing is recorded before the first backsight is. */
export function useSetup(roundId: string, view: ReadyRound) {
  const { bundle, state } = view;
  const recorder = useRecorder(roundId, view);
  const [chosen, setChosen] = useState<Partial<Picked>>({});
  // Worked out anew each time: a benchmark that was just added, and is the only one, is picked when it arrives.
  const picked: Picked = { ...usualPick(bundle, state), ...chosen };
  const [stand, setStand] = useState<PlanPoint | null>(null);
  const [distance, setDistance] = useState('');
  const [kept, setKept] = useState<ReadingEntry | null>(null);
  const [seriesId, setSeriesId] = useState<string | null>(null);
  const [refusal, setRefusal] = useState<SetupRefusal | null>(null);
  const [keeping, setKeeping] = useState(false);
  const atWork = useRef(false);
  const rules = rulesOf(bundle, picked.rodId);
  const style = rules?.style ?? bundle.job.unitStyle;
  // What was keyed for a rod in another unit is no reading of this one; its text still is.
  const entry: ReadingEntry = kept?.style === style ? kept : { ...startEntry(style, null), typed: kept?.typed ?? null };
  const key = (action: EntryAction) => {
    setKept(keyEntry(entry, action));
    setRefusal(null);
  };
  const distanceRule: LengthRule = { style: bundle.job.unitStyle, sign: 'not-negative', bareDecimal: 'feet' };
  const checkLimit = usualCheckLimit(bundle.job.unitStyle);

  /** Everything that has to be there for a backsight, or the sentence for what is not. */
  const ready = () => {
    const { laserId, rodId, benchmarkId } = picked;
    const missing = (where: keyof Picked, sentence: string) => ({ ok: false, refusal: { where, sentence } }) as const;
    if (laserId === null) return missing('laserId', i18n.t('setup:backsight.missing.laser'));
    if (rodId === null || rules === null) return missing('rodId', i18n.t('setup:backsight.missing.rod'));
    if (benchmarkId === null) return missing('benchmarkId', i18n.t('setup:backsight.missing.benchmark'));
    const unread = distance.trim() === '' ? null : lengthRefusal(distance, distanceRule);
    if (unread !== null) return { ok: false, refusal: { where: 'distance', sentence: unread } } as const;
    const reading = readEntry(entry, rules);
    if (reading.kind !== 'reading') {
      return { ok: false, refusal: { where: 'reading', sentence: readingRefusal(reading, rules) } } as const;
    }
    return { ok: true, laserId, rodId, benchmarkId, rules, reading } as const;
  };

  const record = async () => {
    const given = ready();
    setRefusal(given.ok ? null : given.refusal);
    // A second press while the first is on its way to the disk is the same press.
    if (!given.ok || atWork.current) return;
    const { laserId, rodId, benchmarkId, reading } = given;
    atWork.current = true;
    setKeeping(true);
    try {
      const benchmarkDistance = optionalLength(distance, distanceRule);
      const into = seriesId ?? (await recorder.startSetup({ laserId, rodId, stand, benchmarkDistance, checkLimit })).seriesId;
      setSeriesId(into);
      setChosen({ laserId, rodId, benchmarkId });
      await recorder.recordBacksight({
        seriesId: into,
        benchmarkId,
        keyed: reading.keyed,
        style: given.rules.style,
        reading: reading.reading,
      });
      setKept(null);
    } catch (error) {
      if (error instanceof AnalysisError) throw error;
      setRefusal({ where: 'keeping', sentence: i18n.t('setup:backsight.notKept') });
    } finally {
      atWork.current = false;
      setKeeping(false);
    }
  };

  return {
    picked,
    /** What was picked belongs to the setup once that is recorded. */
    fixed: seriesId !== null,
    pick: (part: keyof Picked, id: string) => {
      setChosen({ ...chosen, [part]: id });
      setRefusal(null);
    },
    stand,
    setStand,
    distance,
    setDistance,
    distanceRule,
    entry,
    key,
    /** From the keys back to the field: what was keyed so far stands in it. */
    keepAsText: () => {
      const text = rules ? keyedText(entry, rules) : null;
      setKept({ ...startEntry(style, null), typed: text });
    },
    rules,
    checkLimit,
    refusal,
    refusalAt: (where: SetupRefusal['where']) => (refusal?.where === where ? refusal.sentence : undefined),
    record: () => void record(),
    keeping,
    /** The series that this screen began, once it is on this phone. */
    series: state.series.find(({ id }) => id === seriesId) ?? null,
    strike: (targetId: string) =>
      void recorder
        .strike({ targetId, reason: 'misread' })
        .catch(() => setRefusal({ where: 'keeping', sentence: i18n.t('setup:backsight.notKept') })),
    anew: () => {
      setSeriesId(null);
      setKept(null);
      setRefusal(null);
    },
  };
}

export type Setup = ReturnType<typeof useSetup>;
