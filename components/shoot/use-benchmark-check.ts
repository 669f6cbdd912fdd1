import { useRef, useState } from 'react';
import { gradeRod, type Nm } from '@/analysis';
import type { Recorder } from '@/hooks/round/use-recorder';
import type { ReadyRound } from '@/hooks/round/use-round';
import type { Benchmark } from '@/shared/api/job-endpoints';
import type { RoundSeries } from '@/shared/round/round-state';
import { checkOutcome, type CheckOutcome, type MissedCheck } from './check-flow';
import type { EntryRules } from './read-entry';
import { useEntry, type KeyedEntry } from './use-entry';
import type { Refusal } from './use-recording';

export interface BenchmarkCheck extends KeyedEntry {
  benchmark: Benchmark;
  /** What the last reading said, and how far off it was: positive reads more than it should. Null before the first. */
  said: (Pick<CheckOutcome, 'said'> & { off: Nm; struck: boolean }) | null;
  refusal: Refusal | null;
  record(): void;
}

/** The mark that a series took its backsight on, with its elevation; null where that backsight was struck out. */
export function backsightMark(view: ReadyRound, series: RoundSeries | null): Benchmark | null {
  const backsight = series?.readings.find(({ record, struck }) => record.purpose === 'backsight' && !struck)?.record;
  const { point } = backsight ?? {};
  if (point?.kind !== 'benchmark') return null;
  return view.bundle.benchmarks.find((benchmark) => benchmark.id === point.benchmarkId) ?? null;
}

/**
 * Reads the benchmark again. Every reading is written down as it is keyed, a miss too; readings that later ones refute are
 * struck out as misread, so that what stands is what the laser did.
 */
export function useBenchmarkCheck(
  {
    view,
    series,
    rules,
    recorder,
  }: { view: ReadyRound; series: RoundSeries & { hi: Nm }; rules: EntryRules; recorder: Recorder },
  benchmark: Benchmark,
): BenchmarkCheck {
  const [turn, setTurn] = useState(0);
  const keyed = useEntry(`check ${turn}`, null, rules, view.bundle.job.unitStyle);
  const [missed, setMissed] = useState<MissedCheck[]>([]);
  const [said, setSaid] = useState<BenchmarkCheck['said']>(null);
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const keeping = useRef(false);
  const expected = gradeRod(series.hi, benchmark.elevation);

  const keep = async (text: string, reading: Nm) => {
    if (keeping.current) return;
    keeping.current = true;
    try {
      const input = { seriesId: series.id, benchmarkId: benchmark.id, keyed: text, style: rules.style, reading };
      const id = await recorder.recordCheck(input);
      const outcome = checkOutcome(missed, reading, expected, series.record.checkLimit);
      for (const targetId of outcome.strike) await recorder.strike({ targetId, reason: 'misread' });
      setMissed([
        ...missed.filter((miss) => !outcome.strike.includes(miss.id)),
        ...(outcome.said === 'held' ? [] : [{ id, reading }]),
      ]);
      setSaid({ said: outcome.said, off: reading - expected, struck: outcome.strike.length > 0 });
      setTurn(turn + 1);
    } catch {
      setRefusal({ kind: 'not-kept' });
    } finally {
      keeping.current = false;
    }
  };

  return {
    ...keyed,
    benchmark,
    said,
    refusal,
    key: (action) => {
      setRefusal(null);
      keyed.key(action);
    },
    record: () => {
      const { reading } = keyed;
      if (reading.kind === 'wanting') return setRefusal({ kind: 'wanting', what: reading.what });
      if (reading.kind === 'refused') return setRefusal({ kind: 'entry', error: reading.error });
      return void keep(reading.keyed, reading.reading);
    },
  };
}
