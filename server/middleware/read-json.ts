import { json, type RequestHandler } from 'express';
import { ApiError } from '../errors';

/** Records of a long day in one batch are a few hundred kilobytes. */
const LIMIT = '1mb';

/** A body is JSON or is refused: a form that another site posts is neither read nor guessed at. */
export function readJson(): RequestHandler[] {
  const refuseOthers: RequestHandler = (request, _response, next) => {
    const carriesBody = request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length'] ?? 0) > 0;
    if (carriesBody && !request.is('application/json')) throw new ApiError('body-not-json', 'Requests carry JSON.');
    next();
  };
  return [refuseOthers, json({ limit: LIMIT, strict: true, type: 'application/json' })];
}
