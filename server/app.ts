import { isUtf8 } from 'node:buffer';
import compression from 'compression';
import express, { type Express } from 'express';
import helmet from 'helmet';
import { access } from './access.ts';
import { answersRoutes } from './features/answers/routes.ts';
import { bidsRoutes } from './features/bids/routes.ts';
import { checksRoutes } from './features/checks/routes.ts';
import { healthRoutes } from './features/health/routes.ts';
import { hoursRoutes } from './features/hours/routes.ts';
import { ledgerRoutes } from './features/ledger/routes.ts';
import { importRoutes } from './features/imports/routes.ts';
import { peopleRoutes } from './features/people/routes.ts';
import { rebuildsRoutes } from './features/rebuilds/routes.ts';
import { rulesRoutes } from './features/rules/routes.ts';
import { sessionRoutes } from './features/session/routes.ts';
import { shopRoutes } from './features/shop/routes.ts';
import { clientFiles } from './platform/client-files.ts';
import { mount, type Route, type Services } from './platform/http.ts';
import { requestLog } from './platform/logger.ts';
import { openApiDocument } from './platform/openapi.ts';
import { noSuchRoute, ProblemError, problemHandler } from './platform/problems.ts';
import { sameOriginWrites } from './platform/same-origin.ts';

/** Every route of the product. */
const routes: Route[] = [
  ...healthRoutes(() => openApiDocument(routes, access)),
  ...sessionRoutes,
  ...peopleRoutes,
  ...importRoutes,
  ...shopRoutes,
  ...rebuildsRoutes,
  ...ledgerRoutes,
  ...hoursRoutes,
  ...answersRoutes,
  ...rulesRoutes,
  ...bidsRoutes,
  ...checksRoutes,
];

/** The whole application, ready to listen; tests use this same function. */
export function createApp(services: Services): Express {
  const { config, logger } = services;
  const app = express();
  app.disable('x-powered-by').disable('etag');
  if (config.trustProxy) app.set('trust proxy', config.trustProxy);
  app.use(securityHeaders(config.origin?.startsWith('https:') ?? false));
  app.use(compression({ filter: (req, res) => !isEventStream(res) && compression.filter(req, res) }));
  app.use('/api', requestLog(logger), noStore, sameOriginWrites(config.origin));
  app.use('/api', express.json({ limit: '1mb', strict: true, inflate: false, verify: refuseBrokenText }));
  const api = express.Router();
  mount(api, routes, access, services);
  app.use(api);
  app.use('/api', noSuchRoute);
  app.use(...clientFiles());
  app.use(problemHandler(logger));
  return app;
}

/** Bytes that are no UTF-8 would be replaced in silence while they are read. */
function refuseBrokenText(_req: unknown, _res: unknown, bytes: Buffer): void {
  if (!isUtf8(bytes)) throw new ProblemError(400, { detail: 'The text of this request is damaged: it is not UTF-8.' });
}

const noStore: express.RequestHandler = (_req, res, next) => {
  res.setHeader('Cache-Control', 'no-store');
  next();
};

const isEventStream = (res: { getHeader(name: string): unknown }) =>
  String(res.getHeader('Content-Type')).startsWith('text/event-stream');

function securityHeaders(isHttps: boolean) {
  const own = ["'self'"];
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: own,
        scriptSrc: own,
        styleSrc: own,
        fontSrc: own,
        imgSrc: [...own, 'data:'],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: own,
        frameAncestors: ["'none'"],
      },
    },
    strictTransportSecurity: isHttps ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    referrerPolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
  });
}
