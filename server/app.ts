// The application: routes on an Express app. It does not listen and holds nothing of its own, so tests mount it as it is.
import express, { Router, type ErrorRequestHandler, type Express, type Response } from 'express';
import { pinoHttp } from 'pino-http';
import { accountRoutes } from './account/routes';
import { dryFitRoutes } from './dry-fits/routes';
import { ApiError, problemOf } from './http/api-error';
import { numberRequests, refuseOtherSites, securityHeaders } from './http/guards';
import { describeError, withoutSecrets } from './http/log';
import { servePages } from './http/pages';
import type { Services } from './http/services';
import { meshRoutes } from './meshes/routes';
import { pictureRoutes } from './pictures/routes';
import { projectRoutes } from './projects/routes';
import { sceneRoutes } from './scenes/routes';
import { shareRoutes } from './shares/routes';
import { shareTags } from './shares/tags';
import { teamRoutes } from './teams/routes';

/** Faults that Express and its parsers make themselves, by their type. */
function apiErrorOf(error: unknown): ApiError | null {
  if (error instanceof ApiError) return error;
  const { type, status, cause } = error as { type?: string; status?: number; cause?: { code?: string } };
  if (UNTEXT.has(cause?.code ?? ''))
    return new ApiError('request/invalid', { detail: 'A text has control characters.' });
  if (type === 'entity.too.large') return new ApiError('request/too-large');
  if (type === 'entity.parse.failed') return new ApiError('request/invalid', { detail: 'The body is not JSON.' });
  if (type === 'charset.unsupported' || type === 'encoding.unsupported') return new ApiError('request/not-json');
  if (error instanceof URIError || status === 400) return new ApiError('request/invalid');
  if (status === 404) return new ApiError('thing/missing');
  return null;
}

/** PostgreSQL's words for text that it cannot hold: a NUL, half a surrogate pair. No text of a person has them. */
const UNTEXT = new Set(['22021', '22P05']);

/** Headers of a file that was to be sent do not fit the fault that is sent instead. */
function clearFileHeaders(res: Response): void {
  for (const name of ['ETag', 'Content-Disposition', 'Content-Length', 'Last-Modified']) res.removeHeader(name);
  res.setHeader('Cache-Control', 'no-store');
}

export function createApp(services: Services, options: { readonly clientFolder?: string } = {}): Express {
  const { config, log } = services;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy.length === 0 ? false : [...config.trustProxy]);
  app.set('query parser', 'simple');
  app.use(numberRequests);
  app.use(
    pinoHttp({
      logger: log,
      genReqId: (req) => req.id as string,
      autoLogging: { ignore: (req) => req.url?.startsWith('/assets') === true || req.url === '/api/health' },
      customLogLevel: (_req, res, error) => (error !== undefined || res.statusCode >= 500 ? 'error' : 'info'),
      serializers: {
        req: (req: { id: string; method: string; url: string }) => ({
          id: req.id,
          method: req.method,
          url: withoutSecrets(req.url),
        }),
        res: (res: { statusCode: number }) => ({ status: res.statusCode }),
        err: describeError,
      },
    }),
  );
  app.use(securityHeaders(config));
  app.get('/api/health', (_req, res) => {
    res.json({ alive: true });
  });
  app.get('/api/ready', (_req, res) => {
    res.status(services.ready() ? 200 : 503).json({ ready: services.ready() });
  });
  app.use(refuseOtherSites(config));
  app.use('/api/auth', services.auth.router);

  const api = Router();
  api.use((_req, res, next) => {
    // answers belong to one person and to one moment
    res.setHeader('Cache-Control', 'private, no-cache');
    next();
  });
  for (const routes of [
    accountRoutes,
    teamRoutes,
    projectRoutes,
    sceneRoutes,
    meshRoutes,
    dryFitRoutes,
    pictureRoutes,
    shareRoutes,
  ]) {
    routes(api, services);
  }
  api.use(() => {
    throw new ApiError('thing/missing');
  });
  app.use('/api', api);
  if (options.clientFolder !== undefined) {
    servePages(app, options.clientFolder, (token, req) => shareTags(services, token, req.ip ?? ''));
  }
  app.use(() => {
    throw new ApiError('thing/missing');
  });

  const onError: ErrorRequestHandler = (error: unknown, req, res, next) => {
    if (res.headersSent) return next(error);
    const known = apiErrorOf(error);
    if (known === null) log.error({ err: error, req: { id: req.id } }, 'a request failed');
    clearFileHeaders(res);
    const problem = problemOf(known ?? new ApiError('server/failed'), req.id as string);
    res.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
  };
  app.use(onError);
  return app;
}
