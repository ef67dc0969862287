import { randomUUID } from 'node:crypto';
import compression from 'compression';
import express, { type Express } from 'express';
import helmet from 'helmet';
import { type Logger, pino } from 'pino';
import { pinoHttp } from 'pino-http';
import swaggerUi from 'swagger-ui-express';
import { identify } from './auth/identify.ts';
import { sameOrigin } from './auth/same-origin.ts';
import type { Deps } from './deps.ts';
import { ApiProblem } from './errors.ts';
import { preflight } from './http/cors.ts';
import { mountRoutes } from './http/mount-routes.ts';
import { openApiDocument } from './http/openapi.ts';
import { problemHandler } from './http/problem.ts';
import { site } from './http/site.ts';
import { writeGate } from './jobs/write-gate.ts';
import { siteFolder } from './paths.ts';
import { allRoutes } from './routes.ts';

/** The whole product behind one Express app; it opens no port and reads no setting of its own. */
export function createApp(deps: Deps, logger: Logger = pino({ level: deps.config.logLevel })): Express {
  const { config, db } = deps;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  // Flat parameters only: a repeated key becomes a list and is refused, brackets build nothing.
  app.set('query parser', 'simple');
  app.set('etag', 'weak');

  app.use(
    pinoHttp({
      logger,
      genReqId: requestId,
      serializers: {
        req: ({ id, method, url }) => ({ id, method, url: withoutToken(String(url)) }),
        res: ({ statusCode }) => ({ statusCode }),
      },
    }),
  );
  app.use((req, res, next) => {
    res.setHeader('X-Request-Id', String(req.id));
    next();
  });
  app.use(securityHeaders(config.mode === 'production'));
  app.use(compression({ threshold: 4096 }));

  app.get('/healthz', (_req, res) => {
    res.json({ status: 'alive' });
  });
  app.get('/readyz', (_req, res) => {
    db.$client.prepare('SELECT 1').get();
    res.json({ status: 'ready' });
  });

  const routes = allRoutes(deps);
  const document = openApiDocument(routes);
  const api = express.Router();
  api.use(preflight);
  api.use(express.json({ limit: '1mb', strict: false }));
  api.use(sameOrigin);
  api.use(writeGate(deps.jobs));
  api.use(identify(db, config));
  api.get('/openapi.json', (_req, res) => {
    res.setHeader('Cache-Control', 'no-cache').json(document);
  });
  api.use(mountRoutes(routes, deps));
  app.use('/api/v1', api);
  app.use('/api/docs', docsHeaders, swaggerUi.serve, swaggerUi.setup(document, { customSiteTitle: 'Tiltwright API' }));
  app.use('/api', (req) => {
    throw new ApiProblem('route-not-found', `There is no ${req.method} ${req.originalUrl.split('?')[0]}.`);
  });
  app.use(site(siteFolder));
  app.use(problemHandler);
  return app;
}

/** What follows in these addresses opens something for whoever reads it, also in a log. */
const withoutToken = (url: string) => url.replace(/(\/(?:invitations|password-resets)\/)[^/?]+/, '$1…');

/** A caller's own id is kept where it is short and plain, so that both logs speak of the same request. */
function requestId(req: { headers: Record<string, string | string[] | undefined> }): string {
  const given = req.headers['x-request-id'];
  return typeof given === 'string' && /^[\w.:-]{1,64}$/.test(given) ? given : randomUUID();
}

const policy = {
  defaultSrc: ["'self'"],
  baseUri: ["'none'"],
  objectSrc: ["'none'"],
  frameAncestors: ["'none'"],
  formAction: ["'self'"],
  imgSrc: ["'self'", 'data:'],
  scriptSrc: ["'self'"],
  styleSrc: ["'self'"],
  fontSrc: ["'self'"],
  connectSrc: ["'self'"],
};

/** helmet's own policy would upgrade to https, which breaks plain http on a workshop's network. */
function securityHeaders(production: boolean) {
  return helmet({
    contentSecurityPolicy: { useDefaults: false, directives: policy },
    strictTransportSecurity: production ? { maxAge: 15_552_000 } : false,
    crossOriginOpenerPolicy: production,
    originAgentCluster: production,
    referrerPolicy: { policy: 'same-origin' },
  });
}

/** Swagger UI sets styles of its own in the page. */
const docsHeaders = helmet.contentSecurityPolicy({
  useDefaults: false,
  directives: { ...policy, styleSrc: ["'self'", "'unsafe-inline'"] },
});
