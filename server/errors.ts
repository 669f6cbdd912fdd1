import { ERROR_STATUS, type ErrorBody, type ErrorCode, type FieldError } from '@/shared/error-codes';

/** A refusal that the caller is told: every way the API says no is one of these, and owns its status. */
export class ApiError extends Error {
  readonly status: number;

  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly fields?: Record<string, FieldError>,
    options?: ErrorOptions,
  ) {
    super(message, options);
    this.name = 'ApiError';
    this.status = ERROR_STATUS[code];
  }

  body(): ErrorBody {
    return { error: { code: this.code, message: this.message, ...(this.fields ? { fields: this.fields } : {}) } };
  }
}

/** The same for an id that nobody has and for one that another company has. */
export class NotFound extends ApiError {
  constructor() {
    super('not-found', 'There is no such thing here.');
  }
}

/** The database does not answer. What was asked may be asked again. */
export class DatabaseAway extends ApiError {
  constructor(cause: unknown) {
    super('database-away', 'The database does not answer just now.', undefined, { cause });
  }
}

/** Well formed, and cannot be: says so at one field. `path` is dotted, as in `runs.2.length`. */
export function notPossible(path: string, code: string, message: string, details?: Record<string, unknown>): ApiError {
  return new ApiError('not-possible', message, { [path]: { code, message, ...(details ? { details } : {}) } });
}

export function nameTaken(path: string): ApiError {
  const message = 'Something here has that name already.';
  return new ApiError('name-taken', message, { [path]: { code: 'name-taken', message } });
}
