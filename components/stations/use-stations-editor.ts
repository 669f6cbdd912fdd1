import { useState } from 'react';
import { AnalysisError, type Nm } from '@/analysis';
import { toTheMark, unitsOf } from '@/components/lengths/job-units';
import { lengthRefusal } from '@/components/lengths/length-field';
import { printRound } from '@/components/lengths/print-length';
import { readLength, type LengthRule } from '@/components/lengths/read-length';
import { useAddStation, useChangeStation, useRemoveStation, useSetStations } from '@/hooks/api/footing-queries';
import { i18n } from '@/hooks/i18n/i18n';
import type { Footing } from '@/shared/api/footing-schemas';
import type { Job } from '@/shared/api/job-endpoints';
import { previewStations, SPACING_LIMITS, standingStations, usualSpacing } from './station-preview';

/** Null where the text does not read; the field says why. */
function readOrNull(text: string, rule: LengthRule): Nm | null {
  try {
    return readLength(text, rule);
  } catch (error) {
    if (error instanceof AnalysisError) return null;
    throw error;
  }
}

/** The spacing as it is typed, and the stations that it would put. */
function useSpacing(footing: Footing, job: Job) {
  const style = job.unitStyle;
  const [text, setText] = useState(printRound(footing.spacing ?? usualSpacing(style), style));
  const rule: LengthRule = { style, bareDecimal: 'feet' };
  const spacing = readOrNull(text, rule);
  const print = (length: Nm) => printRound(length, style);
  const outside =
    spacing === null
      ? null
      : spacing < SPACING_LIMITS.least
        ? i18n.t('stations:spacing.least', { least: print(SPACING_LIMITS.least) })
        : spacing > SPACING_LIMITS.most
          ? i18n.t('stations:spacing.most', { most: print(SPACING_LIMITS.most) })
          : null;
  return {
    text,
    setText,
    rule,
    spacing: outside === null ? spacing : null,
    refusal: outside ?? undefined,
    /** Further apart than a straightedge of 10 ft or 3 m can be judged on. */
    tooWide: spacing !== null && outside === null && spacing > usualSpacing(style),
    usual: usualSpacing(style),
    edge: 2 * usualSpacing(style),
    print,
  };
}

/** A station to add by its distance along the walk. */
function useAdding(footing: Footing, job: Job) {
  const units = unitsOf(job);
  const rule: LengthRule = { style: units.style, sign: 'not-negative', bareDecimal: 'feet' };
  const [text, setText] = useState('');
  const [refusal, setRefusal] = useState<string | null>(null);
  const adding = useAddStation(footing.id);
  const walk = footing.runs.reduce((sum, run) => sum + run.length, 0);
  const add = async () => {
    const unread = lengthRefusal(text, rule);
    if (unread !== null) return setRefusal(unread);
    const at = readLength(text, rule);
    if (at > walk) return setRefusal(i18n.t('stations:add.past', { length: toTheMark(walk, units) }));
    if (footing.stations.some((station) => station.at === at)) {
      return setRefusal(i18n.t('stations:add.taken', { at: toTheMark(at, units) }));
    }
    const added = await adding.mutateAsync(at).catch(() => null);
    if (added) setText('');
  };
  const type = (typed: string) => {
    setText(typed);
    setRefusal(null);
  };
  return { text, type, rule, refusal: refusal ?? undefined, add, busy: adding.isPending, error: adding.error };
}

/** Everything that the stations screen shows and does. */
export function useStationsEditor(footing: Footing, job: Job) {
  const spacing = useSpacing(footing, job);
  const laying = useSetStations(footing.id);
  const preview = spacing.spacing === null ? null : previewStations(footing, spacing.spacing);
  const standing = footing.stations.length > 0 ? standingStations(footing) : null;
  const asked = standing === null || spacing.spacing !== footing.spacing;
  return {
    spacing,
    preview,
    standing,
    /** What is drawn: what would be laid out while that differs from what stands. */
    shown: asked ? (preview ?? standing) : standing,
    /** The spacing asked for is not the one that stands. */
    asked,
    layOut: async () => {
      if (spacing.spacing !== null) await laying.mutateAsync(spacing.spacing).catch(() => null);
    },
    laying: laying.isPending,
    error: laying.error,
    adding: useAdding(footing, job),
    changing: useChangeStation(),
    removing: useRemoveStation(),
  };
}

export type StationsEditor = ReturnType<typeof useStationsEditor>;
