/** ml-regression ships no types; what the tests and the benchmark call of it. */
declare module 'ml-regression' {
  export class MultivariateLinearRegression {
    constructor(x: number[][], y: number[][], options?: { intercept?: boolean; statistics?: boolean });
    /** One row a coefficient, the constant last. */
    readonly weights: number[][];
    readonly stdError: number;
    readonly stdErrors: number[];
    /** Covariance of the coefficients, the constant last. */
    readonly stdErrorMatrix: { get(row: number, column: number): number };
  }
}
