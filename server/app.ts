// Puts the Express app together from its seams; never listens, so that each test can start its own.
import { randomUUID } from 'node:crypto';
import fs from 'node:fs';
import type { IncomingMessage, ServerResponse } from 'node:http';
import path from 'node:path';
import compression from 'compression';
import express, { type Express, type Request, type Response } from 'express';
import helmet from 'helmet';
import { pinoHttp, type HttpLogger } from 'pino-http';
import { csrfGuard, sessionLayer } from './http/session';
import { createSeams } from './accounts/seams';
import type { Deps } from './deps';
import { mount } from './http/mount';
import { openApiDocument } from './http/openapi';
import { errorHandler, sendProblem } from './http/problem';
import { refuse } from './http/refusal';
import { paymentWebhook } from './money/webhook';
import { allRoutes } from './routes';
import { demoRoutes } from './system/routes';

const JSON_LIMIT = '256kb';

function securityHeaders(deps: Deps): ReturnType<typeof helmet> {
  const storage = deps.env.S3_ENDPOINT ? [new URL(deps.env.S3_ENDPOINT).origin] : [];
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        imgSrc: ["'self'", 'data:', 'blob:', ...storage],
        objectSrc: ["'none'"],
        scriptSrc: ["'self'"],
        // React sets element styles (positions of drawings) through the style attribute only.
        styleSrc: ["'self'"],
        styleSrcAttr: ["'unsafe-inline'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'", 'blob:'],
        manifestSrc: ["'self'"],
        fontSrc: ["'self'"],
      },
    },
    strictTransportSecurity: deps.env.NODE_ENV === 'production' ? { maxAge: 31_536_000 } : false,
    crossOriginEmbedderPolicy: false,
    referrerPolicy: { policy: 'strict-origin-when-cross-origin' },
  });
}

function requestLog(deps: Deps): HttpLogger {
  return pinoHttp({
    logger: deps.log,
    genReqId: () => randomUUID(),
    autoLogging: { ignore: (req: IncomingMessage) => !req.url?.startsWith('/api/') },
    redact: { paths: ['req.headers', 'res.headers'], remove: true },
    customLogLevel: (_req: IncomingMessage, res: ServerResponse, error?: Error) => (error || res.statusCode >= 500 ? 'error' : 'debug'),
  });
}

/** The built client, with the page itself as the answer to every address that isn't a file. */
function serveClient(app: Express, folder: string): void {
  const page = path.join(folder, 'index.html');
  if (!fs.existsSync(page)) return;
  app.use(express.static(folder, { index: false, maxAge: '1y', immutable: true, setHeaders: keepPageFresh }));
  app.get('/{*path}', (_req: Request, res: Response) => {
    res.set('Cache-Control', 'no-cache').sendFile(page);
  });
}

function keepPageFresh(res: Response, file: string): void {
  if (!file.includes(`${path.sep}assets${path.sep}`)) res.set('Cache-Control', 'no-cache');
}

export function createApp(deps: Deps, options: { clientFolder?: string } = {}): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', deps.env.TRUST_PROXY);
  app.set('query parser', 'simple');
  app.use(requestLog(deps));
  app.use(securityHeaders(deps));
  app.use((_req, res, next) => {
    res.set('Permissions-Policy', 'camera=(self), geolocation=(), microphone=(), payment=()');
    next();
  });
  app.use(compression());
  app.post('/api/payments/webhook', express.raw({ type: () => true, limit: '1mb' }), paymentWebhook(deps));
  app.use('/api', express.json({ limit: JSON_LIMIT, strict: true }));
  app.use('/api', ...sessionLayer(deps));
  app.use('/api', csrfGuard(deps));
  const routes = deps.demoClock ? [...allRoutes, ...demoRoutes] : allRoutes;
  const document = openApiDocument(routes.map((one) => one.endpoint));
  app.get('/api/openapi.json', (_req, res) => {
    res.json(document);
  });
  mount(app, routes, deps, createSeams(deps));
  app.use('/api', (req: Request, res: Response) =>
    sendProblem(req, res, refuse('not_found', 'There is nothing at this address.')),
  );
  if (options.clientFolder) serveClient(app, options.clientFolder);
  app.use(errorHandler);
  return app;
}
