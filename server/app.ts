import compression from 'compression';
import express, { type Express } from 'express';
import session from 'express-session';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import { ApiFailure } from '@/server/errors/api-failure';
import { assignRequestId, requestIdOf } from '@/server/http/request-id';
import { errorHandler } from '@/server/http/error-handler';
import { forgeryGuard } from '@/server/http/forgery-guard';
import { healthRouter, type Readiness } from '@/server/http/health';
import { mountEndpoints } from '@/server/http/mount-endpoints';
import { openApiDocument } from '@/server/http/openapi';
import { factsOf } from '@/server/http/request-facts';
import { secureOnLoopback } from '@/server/http/secure-on-loopback';
import { webClient } from '@/server/http/web-client';
import { sessionLimits } from '@/server/account/session-store';
import { type Logger } from '@/server/runtime/logger';
import { createServices, type Surroundings } from '@/server/services';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { apiRoot } from '@/shared/contract/request-headers';

export interface RunningApp {
  readonly app: Express;
  readonly readiness: Readiness;
  readonly close: () => Promise<void>;
}

/** Puts the server together; what it depends on is passed in. */
export function createApp(surroundings: Surroundings & { readonly logger: Logger }): RunningApp {
  const { configuration, dataSource, ids, logger } = surroundings;
  const services = createServices(surroundings);
  const readiness: Readiness = { isAccepting: true };
  const app = express();
  app.disable('x-powered-by');
  app.set('query parser', 'simple');
  app.set('trust proxy', configuration.TRUST_PROXY_HOPS);

  app.use(assignRequestId(ids));
  app.use(securityHeaders(configuration.PUBLIC_ORIGIN));
  app.use(healthRouter(dataSource, readiness));
  app.use(requestLog(logger));
  app.use(compression());

  app.use(apiRoot, (_, response, next) => {
    response.set('Cache-Control', 'no-store');
    next();
  });
  app.get(`${apiRoot}/openapi.json`, (_, response) => void response.json(openApiDocument(allEndpoints)));
  app.use(apiRoot, forgeryGuard(configuration.PUBLIC_ORIGIN));
  app.use(apiRoot, secureOnLoopback);
  app.use(
    apiRoot,
    session({
      name: '__Host-brierbook',
      secret: configuration.SESSION_SECRET,
      store: services.sessionStore,
      resave: false,
      saveUninitialized: false,
      rolling: false,
      cookie: { path: '/', secure: true, httpOnly: true, sameSite: 'lax', maxAge: sessionLimits.absoluteMs },
    }),
  );
  app.use(apiRoot, services.flow.passport.initialize());
  app.use(
    apiRoot,
    mountEndpoints({
      endpoints: allEndpoints,
      handlers: services.handlers,
      me: services.me,
      signedInPerson: (request) => services.flow.signedInPerson(request),
    }),
  );
  app.use(webClient(configuration.WEB_ROOT));
  app.use((_, __, next) => next(new ApiFailure('not-found', 'There is no such address.')));
  app.use(errorHandler(logger));
  return { app, readiness, close: services.close };
}

/** Nothing from elsewhere runs or is fetched; styles are inline because the renderer writes them so. */
function securityHeaders(publicOrigin: string) {
  const isTls = publicOrigin.startsWith('https://');
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
        formAction: ["'self'"],
      },
    },
    referrerPolicy: { policy: 'no-referrer' },
    strictTransportSecurity: isTls ? { maxAge: 31_536_000, includeSubDomains: true } : false,
  });
}

/** One line a request: who it was is known by its number only. */
function requestLog(logger: Logger) {
  return pinoHttp({
    logger,
    genReqId: (request) => requestIdOf(request as express.Request), // express hands its own request on
    serializers: {
      req: ({ id, method, url }: { id: string; method: string; url: string }) => ({
        id,
        method,
        path: url.split('?')[0],
      }),
      res: ({ statusCode }: { statusCode: number }) => ({ status: statusCode }),
      err: () => undefined, // the error handler logs what is worth it
    },
    customSuccessObject: (request, _, line: object) => ({ ...line, ...factsOf(request) }),
    customErrorObject: (request, _, __, line: object) => ({ ...line, ...factsOf(request) }),
    autoLogging: { ignore: (request) => !request.url?.startsWith(apiRoot) },
  });
}
