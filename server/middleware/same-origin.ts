import type { RequestHandler } from 'express';
import { isLoopback } from '../config';
import { ApiError } from '../errors';

/**
 * Refuses a request that another site's page sent, for routes that read or write the sign-in cookie. Browsers name the page's origin
 * on every such request; what names none is no browser, and has nobody's cookie.
 */
export function sameOrigin(appUrl: URL): RequestHandler {
  return (request, _response, next) => {
    const origin = request.headers.origin;
    if (origin !== undefined && !isSameOrigin(origin, appUrl))
      throw new ApiError('origin-refused', 'This came from another site.');
    next();
  };
}

function isSameOrigin(text: string, appUrl: URL): boolean {
  if (!URL.canParse(text)) return false;
  const origin = new URL(text);
  // The names of loopback are one address.
  if (isLoopback(appUrl) && isLoopback(origin)) return origin.protocol === appUrl.protocol && origin.port === appUrl.port;
  return origin.origin === appUrl.origin;
}
