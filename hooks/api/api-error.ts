import type { ErrorCode, FieldError } from '@/shared/error-codes';

/** The server answered, and refused. `fields` says by dotted path of the body what is wrong where. */
export class ApiError extends Error {
  readonly status: number;
  readonly code: ErrorCode;
  readonly fields: Readonly<Record<string, FieldError>>;

  constructor(
    status: number,
    code: ErrorCode,
    message: string,
    { fields = {}, cause }: { fields?: Record<string, FieldError>; cause?: unknown } = {},
  ) {
    super(message, { cause });
    this.name = 'ApiError';
    this.status = status;
    this.code = code;
    this.fields = fields;
  }
}

/** The server did not answer: no signal, or it is down. Nothing is known of what became of the request. */
export class OfflineError extends Error {
  constructor(cause: unknown) {
    super('The server did not answer.', { cause });
    this.name = 'OfflineError';
  }
}

/** Whether trying again later may help without anything being changed. */
export function isPassing(error: unknown): boolean {
  return error instanceof OfflineError || (error instanceof ApiError && (error.status >= 500 || error.status === 429));
}
