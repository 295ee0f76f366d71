// What stands before every request: security headers, the request's number, and a lock against other sites.
import { randomUUID } from 'node:crypto';
import type { NextFunction, Request, RequestHandler, Response } from 'express';
import helmet from 'helmet';
import type { Config } from '../config';
import { ApiError } from './api-error';

export function securityHeaders(config: Config): RequestHandler {
  const isSecure = config.baseUrl.startsWith('https:');
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
        workerSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
    strictTransportSecurity: isSecure ? { maxAge: 31_536_000 } : false,
    // pictures of share links are shown on other sites
    crossOriginResourcePolicy: { policy: 'cross-origin' },
    crossOriginEmbedderPolicy: false,
    crossOriginOpenerPolicy: isSecure ? { policy: 'same-origin' } : false,
    originAgentCluster: false,
  });
}

export function numberRequests(req: Request, res: Response, next: NextFunction): void {
  req.id = randomUUID();
  res.setHeader('X-Request-Id', req.id);
  next();
}

/** Refuses a body that is no JSON: forms and plain text can be sent by other sites' pages. A body of no bytes is none. */
export function assertJson(req: Request): void {
  const isEmpty = req.headers['transfer-encoding'] === undefined && Number(req.headers['content-length'] ?? 0) === 0;
  if (!isEmpty && req.is('application/json') === false) throw new ApiError('request/not-json');
}

/** Refuses changes that another site's page sends with the person's cookie. */
export function refuseOtherSites(config: Config): RequestHandler {
  const allowed = new Set([config.baseUrl, ...config.origins]);
  return (req, _res, next) => {
    if (req.method === 'GET' || req.method === 'HEAD') return next();
    const { origin } = req.headers;
    if (origin !== undefined) {
      const isOwn = allowed.has(origin) || origin.replace(/^https?:\/\//, '') === req.headers.host;
      return isOwn ? next() : next(new ApiError('request/forbidden-origin'));
    }
    const site = req.headers['sec-fetch-site'];
    if (site === undefined || site === 'same-origin' || site === 'none') return next();
    next(new ApiError('request/forbidden-origin'));
  };
}
