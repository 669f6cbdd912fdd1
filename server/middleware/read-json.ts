import { json, type RequestHandler } from 'express';
import { ApiError } from '../errors';

/** Records of a long day in one batch are a few hundred kilobytes. */
const LIMIT = '1mb';
/** Nothing that is asked for here is nested deeper than half of this, and what walks a body walks it by calling itself. */
const DEEPEST = 16;

/** A body is JSON or is refused: a form that another site posts is neither read nor guessed at. */
export function readJson(): RequestHandler[] {
  const refuseOthers: RequestHandler = (request, _response, next) => {
    const carriesBody = request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length'] ?? 0) > 0;
    if (carriesBody && !request.is('application/json')) throw new ApiError('body-not-json', 'Requests carry JSON.');
    next();
  };
  const refuseDeep: RequestHandler = (request, _response, next) => {
    if (isDeeper(request.body, DEEPEST)) throw new ApiError('body-malformed', 'The body is nested deeper than anything here.');
    next();
  };
  return [refuseOthers, json({ limit: LIMIT, strict: true, type: 'application/json' }), refuseDeep];
}

/** Whether lists and objects lie within one another more than `deepest` times. Goes level by level, so that depth costs it no stack. */
function isDeeper(body: unknown, deepest: number): boolean {
  let level = [body];
  for (let depth = 0; depth <= deepest; depth += 1) {
    level = level.flatMap((part) => (typeof part === 'object' && part !== null ? Object.values(part) : []));
    if (level.length === 0) return false;
  }
  return true;
}
