import type { Graduation, LengthStyle, Nm } from '@/analysis';

/** What a station's reading came to. A station with no deviation is `not-shot`. */
export type MarkKind = 'high' | 'low' | 'in' | 'not-shot';

/** One station as every chart draws it. */
export interface ChartStation {
  id: string;
  /** As people call it: "C", "C + 8 ft", "0+74". */
  label: string;
  mark: MarkKind;
  /** Too close to call: a ring round the mark. */
  close?: boolean;
  /** To look at again: a square with a question mark in place of the mark. */
  suspect?: boolean;
}

/** A station on the footing unrolled. */
export interface ProfilePoint extends ChartStation {
  /** Distance along the walk. */
  at: Nm;
  /** From plan grade, positive is high; null where nothing was shot. */
  deviation: Nm | null;
}

/** A corner or step: a thin vertical with its name under it, such as "A 0+00"; the first word is kept where room is short. */
export interface ProfileCorner {
  at: Nm;
  label: string;
}

/** How far a reading may stand from plan grade: both positive. */
export interface ChartTolerance {
  low: Nm;
  high: Nm;
}

/** How the job writes its lengths. */
export interface ChartUnits {
  style: LengthStyle;
  graduation: Graduation;
}

/** Place on the plan: x east, y north. */
export interface PlanPlace {
  x: Nm;
  y: Nm;
}

/** A station on the plan. */
export interface PlanStation extends ChartStation, PlanPlace {}
