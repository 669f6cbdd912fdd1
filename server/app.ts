import express, { type Express } from 'express';
import type { Handlers } from './api/handler';
import { registerEndpoints, type Guards } from './api/register-endpoints';
import type { Dependencies } from './dependencies';
import { NotFound } from './errors';
import { crewHandlers } from './features/crew/crew-handlers';
import { footingHandlers } from './features/footings/footing-handlers';
import { instrumentHandlers } from './features/instruments/instrument-handlers';
import { jobHandlers } from './features/jobs/job-handlers';
import { roundHandlers } from './features/rounds/round-handlers';
import { serviceHandlers } from './features/service/service-handlers';
import { sessionHandlers } from './features/session/session-handlers';
import { todayHandlers } from './features/today/today-handlers';
import { answerErrors } from './middleware/answer-errors';
import { signInLimits, signUpLimits } from './middleware/rate-limits';
import { readJson } from './middleware/read-json';
import { sameOrigin } from './middleware/same-origin';
import { securityHeaders } from './middleware/security-headers';
import { serveWeb } from './web';

/** The whole server but its socket. Everything that changes from one run to the next comes in. */
export function createApp(dependencies: Dependencies): Express {
  const { config, logger } = dependencies;
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false);
  if (config.trustProxy !== null) app.set('trust proxy', config.trustProxy);
  app.use(securityHeaders(config.appUrl));
  app.use('/api', ...readJson());
  registerEndpoints(app, handlersOf(dependencies), guardsOf(dependencies), dependencies);
  app.use('/api', () => {
    throw new NotFound();
  });
  if (config.webDir !== null) app.use(serveWeb(config.webDir));
  app.use(() => {
    throw new NotFound();
  });
  app.use(answerErrors(logger));
  return app;
}

function handlersOf(dependencies: Dependencies): Handlers {
  return {
    ...serviceHandlers(dependencies),
    ...sessionHandlers(dependencies),
    ...crewHandlers,
    ...jobHandlers,
    ...instrumentHandlers,
    ...footingHandlers,
    ...roundHandlers,
    ...todayHandlers,
  };
}

function guardsOf(dependencies: Dependencies): Guards {
  const own = sameOrigin(dependencies.config.appUrl);
  return {
    signUp: [own, ...signUpLimits(dependencies)],
    signIn: [own, ...signInLimits(dependencies)],
    refresh: [own],
    signOut: [own],
  };
}
