import helmet from 'helmet';
import type { RequestHandler } from 'express';

/** Nothing from elsewhere runs, is drawn, or frames the app. Over plain http (loopback) nothing is turned into https. */
export function securityHeaders(appUrl: URL): RequestHandler {
  const https = appUrl.protocol === 'https:';
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        // react-native-web writes its rules into a style element of the page.
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(https ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: https ? { maxAge: 31_536_000 } : false,
    referrerPolicy: { policy: 'same-origin' },
  });
}
