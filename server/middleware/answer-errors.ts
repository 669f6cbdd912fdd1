import type { ErrorRequestHandler } from 'express';
import type { Logger } from 'pino';
import { z } from 'zod';
import type { ErrorCode } from '@/shared/error-codes';
import { sqlState, UNTENABLE_TEXT } from '../database/database';
import { ApiError } from '../errors';

/** What Express and its body reader throw: an HTTP status, and for the reader a kind. */
const httpErrorSchema = z.object({ status: z.int().min(400).max(499), type: z.string().optional() });

/** The last handler: every error leaves in the one shape, and what is no refusal of ours is logged and told as no more than a fault. */
export function answerErrors(logger: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) return next(error);
    const told = toApiError(error);
    if (told.status >= 500) logger.error({ err: error, method: request.method, path: request.path }, 'a request failed');
    if (told.status === 503) response.set('Retry-After', '2');
    response.status(told.status).set('Cache-Control', 'no-store').json(told.body());
  };
}

function toApiError(error: unknown): ApiError {
  if (error instanceof ApiError) return error;
  if (sqlState(error) === UNTENABLE_TEXT) return new ApiError('body-invalid', 'A text has a character that no text may have.');
  const http = httpErrorSchema.safeParse(error);
  if (!http.success)
    return new ApiError('server-fault', 'Something went wrong on the server. It is in the log.', undefined, { cause: error });
  const code = codeOf(http.data.status, http.data.type);
  return new ApiError(code, HTTP_MESSAGES[code], undefined, { cause: error });
}

const HTTP_MESSAGES = {
  'body-too-large': 'That is more than a request may carry.',
  'body-not-json': 'Requests carry JSON.',
  'body-malformed': 'The body is no JSON.',
  'params-invalid': 'The address is not understood.',
} as const satisfies Partial<Record<ErrorCode, string>>;

function codeOf(status: number, type: string | undefined): keyof typeof HTTP_MESSAGES {
  if (status === 413) return 'body-too-large';
  if (status === 415) return 'body-not-json';
  return type === undefined ? 'params-invalid' : 'body-malformed';
}
