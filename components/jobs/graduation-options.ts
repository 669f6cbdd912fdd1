import { printSmall } from '@/components/lengths/print-length';
import { i18n } from '@/hooks/i18n/i18n';
import { GRADUATIONS, UNIT_STYLES, type UnitStyle } from '@/shared/quantities';
import { WALL_TYPES, type WallType } from '@/shared/rules';

/** The marks that rods of a style are read to, coarse to fine; the value is the nanometres as text. */
export const graduationOptions = (style: UnitStyle) =>
  GRADUATIONS[style].map((mark) => ({ value: String(mark), label: printSmall(mark, style) }));

export const styleOptions = (): { value: UnitStyle; label: string; note: string }[] =>
  UNIT_STYLES.map((value) => ({ value, label: i18n.t(`jobs:style.${value}.name`), note: i18n.t(`jobs:style.${value}.note`) }));

export const wallOptions = (): { value: WallType; label: string }[] =>
  WALL_TYPES.map((value) => ({ value, label: i18n.t(`jobs:wall.${value}`) }));
