import { AnalysisError } from '@/analysis';
import { printSmall } from '@/components/lengths/print-length';
import { readLength, styleOfText } from '@/components/lengths/read-length';
import { SURFACES, type BedRuleInput, type Surface, type ToleranceRuleInput } from '@/shared/rules';
import type { UnitStyle } from '@/shared/quantities';

/** A tolerance as it is keyed: both limits with their unit. */
export interface ToleranceDraft {
  low: string;
  high: string;
  decision: ToleranceRuleInput['decision'];
}
/** Part of every form that holds tolerances. */
export interface RulesForm {
  rules: Record<Surface, ToleranceDraft>;
}

/** A bed rule as it is keyed; `fraction` is how much of the width is bedded, 1 or about a half. */
export interface BedDraft {
  material: BedRuleInput['material'];
  least: string;
  most: string;
  nominal: string;
  grindMost: string;
  fraction: string;
  courseHeight: string;
}
/** Part of every form that holds a bed rule. */
export interface BedForm {
  bed: BedDraft;
}

export function toleranceDraft({ low, high, decision, style }: ToleranceRuleInput): ToleranceDraft {
  return { low: printSmall(low, style), high: printSmall(high, style), decision };
}

export function toleranceDrafts(rules: Record<Surface, ToleranceRuleInput>): Record<Surface, ToleranceDraft> {
  return {
    dig: toleranceDraft(rules.dig),
    rails: toleranceDraft(rules.rails),
    wet: toleranceDraft(rules.wet),
    top: toleranceDraft(rules.top),
  };
}

/** What was keyed with its unit written out, so that it means the same when the job's unit changes; as it is where it does not read. */
export function withUnit(text: string, style: UnitStyle): string {
  try {
    const rule = { style, sign: 'not-negative' } as const;
    return printSmall(readLength(text, rule), styleOfText(text, rule));
  } catch (error) {
    if (error instanceof AnalysisError) return text;
    throw error;
  }
}

/** @throws AnalysisError of `readLength` */
export function readTolerance({ low, high, decision }: ToleranceDraft, style: UnitStyle): ToleranceRuleInput {
  const rule = { style, sign: 'not-negative' } as const;
  // A tolerance is shown in its own unit: the one it was keyed in.
  return { low: readLength(low, rule), high: readLength(high, rule), decision, style: styleOfText(high, rule) };
}

/** @throws AnalysisError of `readLength` */
export function readTolerances(drafts: Record<Surface, ToleranceDraft>, style: UnitStyle): Record<Surface, ToleranceRuleInput> {
  const [dig, rails, wet, top] = [drafts.dig, drafts.rails, drafts.wet, drafts.top].map((draft) => readTolerance(draft, style));
  if (!dig || !rails || !wet || !top) throw new Error(`four surfaces have a rule, ${SURFACES.join(', ')}`);
  return { dig, rails, wet, top };
}

export function bedDraft(rule: BedRuleInput): BedDraft {
  const print = (length: number) => printSmall(length, rule.style);
  return {
    material: rule.material,
    least: print(rule.least),
    most: print(rule.most),
    nominal: print(rule.nominal),
    grindMost: print(rule.grindMost),
    fraction: String(rule.beddedFraction),
    courseHeight: rule.courseHeight === null ? '' : print(rule.courseHeight),
  };
}

/** @throws AnalysisError of `readLength` */
export function readBed(draft: BedDraft, style: UnitStyle): BedRuleInput {
  const fromZero = { style, sign: 'not-negative' } as const;
  return {
    material: draft.material,
    least: readLength(draft.least, fromZero),
    most: readLength(draft.most, { style }),
    nominal: readLength(draft.nominal, fromZero),
    grindMost: readLength(draft.grindMost, fromZero),
    beddedFraction: Number(draft.fraction),
    courseHeight: draft.courseHeight.trim() === '' ? null : readLength(draft.courseHeight, { style }),
    style: styleOfText(draft.most, { style }),
  };
}
