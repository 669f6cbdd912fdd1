/** The maths of the product: pure functions on whole nanometres. docs/maths.md explains each result. */
export * from './analysis-error';
export * from './lengths';
export * from './types';
export * from './units';
export { fUpperTail, studentTwoSided, studentUpperQuantile } from './distributions';
export { fitPlane } from './plane-fit';
