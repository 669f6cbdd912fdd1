import type { z } from 'zod';
import type { Request } from 'express';
import type { Endpoint } from '@/shared/api/endpoint';
import type { ErrorCode, FieldError } from '@/shared/error-codes';
import { ApiError } from '../errors';

const MESSAGES = {
  'params-invalid': 'The address names something in a way that is not understood.',
  'query-invalid': 'The question after the address is not understood.',
  'body-invalid': 'What was sent is not what is asked for here.',
} as const satisfies Partial<Record<ErrorCode, string>>;

export interface ParsedParts {
  params: unknown;
  query: unknown;
  body: unknown;
}

/**
 * Reads a request by its row of the table.
 * @throws ApiError 'params-invalid', 'query-invalid' or 'body-invalid', with what is wrong by dotted path
 */
export function parseRequest(row: Endpoint, request: Request): ParsedParts {
  return {
    params: parsePart(row.params, request.params, 'params-invalid'),
    query: row.query === null ? undefined : parsePart(row.query, request.query, 'query-invalid'),
    body: parsePart(row.body, request.body, 'body-invalid'),
  };
}

function parsePart(schema: z.ZodType | null, value: unknown, code: keyof typeof MESSAGES): unknown {
  if (schema === null) return undefined;
  const read = schema.safeParse(value);
  if (read.success) return read.data;
  throw new ApiError(code, MESSAGES[code], fieldErrors(read.error.issues));
}

/** Dotted path to what is wrong there; an unknown key is named by its own path. The first complaint of a path stands. */
export function fieldErrors(issues: readonly z.core.$ZodIssue[]): Record<string, FieldError> {
  // A map, because a key that somebody sends may be called `constructor`, which every object has.
  const fields = new Map<string, FieldError>();
  for (const issue of issues) {
    const keys = issue.code === 'unrecognized_keys' ? issue.keys.map((key) => [...issue.path, key]) : [issue.path];
    const code = issue.code === 'unrecognized_keys' ? 'unknown-key' : issue.code.replaceAll('_', '-');
    for (const key of keys) {
      const path = key.map(String).join('.');
      if (!fields.has(path)) fields.set(path, { code, message: issue.message, ...detailsOf(issue) });
    }
  }
  return Object.fromEntries(fields);
}

function detailsOf(issue: z.core.$ZodIssue): { details?: Record<string, unknown> } {
  if (issue.code === 'too_small') return { details: { minimum: Number(issue.minimum), origin: issue.origin } };
  if (issue.code === 'too_big') return { details: { maximum: Number(issue.maximum), origin: issue.origin } };
  return {};
}
