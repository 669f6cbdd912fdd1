import { z } from 'zod';

/** Every way in which the API refuses, with its HTTP status. Screens speak from the catalogue by this code. */
export const ERROR_STATUS = {
  'body-malformed': 400,
  'body-invalid': 400,
  'params-invalid': 400,
  'query-invalid': 400,
  'signed-out': 401,
  'sign-in-refused': 401,
  'refresh-refused': 401,
  'role-refused': 403,
  'origin-refused': 403,
  'not-found': 404,
  'method-not-allowed': 405,
  /** Somebody changed the same thing first; load it again. */
  'out-of-date': 409,
  'name-taken': 409,
  'outline-has-shots': 409,
  'station-has-shots': 409,
  'round-closed': 409,
  'body-too-large': 413,
  'body-not-json': 415,
  /** The request is well formed, and says something that cannot be (an outline that crosses itself). */
  'not-possible': 422,
  'too-many-tries': 429,
  'server-fault': 500,
  'database-away': 503,
} as const;

export type ErrorCode = keyof typeof ERROR_STATUS;

/** `fields` says by dotted path what is wrong where; the value is a code of the catalogue, the words are the screen's. */
export const fieldErrorSchema = z.strictObject({
  code: z.string(),
  message: z.string(),
  details: z.record(z.string(), z.unknown()).optional(),
});
export const errorBodySchema = z.strictObject({
  error: z.strictObject({
    code: z.enum(Object.keys(ERROR_STATUS) as [ErrorCode, ...ErrorCode[]]), // Object.keys forgets the key type
    message: z.string(),
    fields: z.record(z.string(), fieldErrorSchema).optional(),
  }),
});
export type ErrorBody = z.infer<typeof errorBodySchema>;
export type FieldError = z.infer<typeof fieldErrorSchema>;
