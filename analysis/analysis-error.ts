/**
 * Thrown by every function of this package on input it cannot answer for. Programs read `code` (kebab-case, stable) and `details`
 * (numbers in the unit that the code's own documentation names, nanometres unless it says otherwise); the English message is for the log.
 */
export class AnalysisError extends Error {
  readonly code: string;
  readonly details: Record<string, unknown>;

  constructor(code: string, message: string, details: Record<string, unknown> = {}) {
    super(message);
    this.name = 'AnalysisError';
    this.code = code;
    this.details = details;
  }
}
