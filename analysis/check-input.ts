import { AnalysisError } from './analysis-error';

/**
 * Every number is checked on its way in, so that no comparison below can pass or fail quietly on NaN.
 * Each returns the value, −0 made 0, and throws `AnalysisError` with details `{ name, value }`.
 */
export function finite(name: string, value: number): number {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    throw new AnalysisError('not-finite', `${name} must be a finite number, got ${String(value)}.`, { name, value });
  }
  return value === 0 ? 0 : value;
}

/** Finite and at least zero, else 'negative'. */
export function notNegative(name: string, value: number): number {
  const checked = finite(name, value);
  if (checked < 0) throw new AnalysisError('negative', `${name} must not be negative, got ${checked}.`, { name, value });
  return checked;
}

/** Finite and above zero, else 'not-positive'. */
export function positive(name: string, value: number): number {
  const checked = finite(name, value);
  if (checked <= 0)
    throw new AnalysisError('not-positive', `${name} must be greater than zero, got ${checked}.`, { name, value });
  return checked;
}

/** A result that left the range of doubles on finite input is refused, not handed on: 'out-of-range'. */
export function inRange(name: string, value: number): number {
  if (!Number.isFinite(value)) {
    throw new AnalysisError('out-of-range', `${name} is beyond what can be computed from this input.`, { name });
  }
  return value === 0 ? 0 : value;
}

/** A length or elevation that whole nanometres can hold exactly (up to 2^53, about 9,000 km), else 'out-of-range'. */
export function nanometres(name: string, value: number): number {
  const checked = finite(name, value);
  if (Math.abs(checked) > Number.MAX_SAFE_INTEGER) {
    throw new AnalysisError('out-of-range', `${name} is longer than nanometres can hold exactly, got ${checked}.`, {
      name,
      value,
    });
  }
  return checked;
}

/** `nanometres`, and at least zero, else 'negative'. */
export function lengthFromZero(name: string, value: number): number {
  return nanometres(name, notNegative(name, value));
}

/** `nanometres`, and above zero, else 'not-positive'. */
export function positiveLength(name: string, value: number): number {
  return nanometres(name, positive(name, value));
}
