import { readLength } from '@/components/lengths/read-length';
import type { NewFooting } from '@/hooks/api/footing-queries';
import type { MeasuredOn } from '@/shared/api/footing-schemas';
import type { UnitStyle } from '@/shared/quantities';

/** Where a street or mark lies, as somebody says it who stands at the start of the first run and looks along it. */
export const SIDES = ['ahead', 'right', 'behind', 'left'] as const;
export type Side = (typeof SIDES)[number];

/** The first run heads plan east, 90 degrees from plan north. */
const AZIMUTH: Record<Side, number> = { ahead: 90, right: 180, behind: 270, left: 0 };

/** A footing as it is keyed. */
export interface FootingForm {
  name: string;
  planGrade: string;
  width: string;
  thickness: string;
  wallThickness: string;
  measuredOn: MeasuredOn;
  rails: 'centre' | 'both';
  railOffset: string;
  dig: 'needed' | 'not-needed';
  landmark: string;
  side: Side;
}

export const blankFooting: FootingForm = {
  name: '',
  planGrade: '',
  width: '',
  thickness: '',
  wallThickness: '',
  measuredOn: 'wall-face',
  rails: 'centre',
  railOffset: '',
  dig: 'needed',
  landmark: '',
  side: 'ahead',
};

/** What the form's fields take, by the job's style. An elevation on a drawing may be decimal feet in a job of inches. */
export const footingRules = (style: UnitStyle) =>
  ({
    planGrade: { style, sign: 'any', bareDecimal: 'feet' },
    size: { style },
    railOffset: { style, sign: 'any' },
  }) as const;

/** @throws AnalysisError of `readLength` */
export function readFooting(form: FootingForm, style: UnitStyle): NewFooting {
  const rules = footingRules(style);
  const landmark = form.landmark.trim();
  return {
    name: form.name.trim(),
    planGrade: readLength(form.planGrade, rules.planGrade),
    width: readLength(form.width, rules.size),
    thickness: readLength(form.thickness, rules.size),
    wallThickness: readLength(form.wallThickness, rules.size),
    measuredOn: form.measuredOn,
    rails: form.rails,
    railOffset: form.railOffset.trim() === '' ? 0 : readLength(form.railOffset, rules.railOffset),
    digNeeded: form.dig === 'needed',
    landmark: landmark === '' ? null : { name: landmark, azimuth: AZIMUTH[form.side] },
  };
}
