/** The maths of the product: pure functions on whole nanometres. docs/maths.md explains each result. */
export * from './analysis-error';
export * from './flatness';
export * from './lengths';
export * from './level-notes';
export * from './misclosure';
export { cornerLetter, diagonals, traceOutline, type Diagonal } from './outline';
export * from './outline-offset';
export * from './stations-along';
export * from './types';
export * from './units';
export * from './verdict';
export { fUpperTail, studentTwoSided, studentUpperQuantile } from './distributions';
export { fitPlane } from './plane-fit';
export { tiltAgainstLaser } from './tilt-against-laser';
export { shotUncertainty } from './uncertainty';
