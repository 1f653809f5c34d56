import cookieParser from 'cookie-parser';
import express, { type Express } from 'express';
import { rateLimit } from 'express-rate-limit';
import helmet from 'helmet';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import { AppError } from './app-error.ts';
import { errorAnswer } from './error-answer.ts';
import type { Route } from './route.ts';
import { runRoute, type RouteContext } from './run-route.ts';
import { serveClient } from './serve-client.ts';

export interface AppOptions extends RouteContext {
  routes: readonly Route[];
  logger: Logger;
  /** Sign-ins tried from one address in a quarter of an hour. */
  signInLimit: number;
  /** Folder of the built client; absent where a development server serves it. */
  clientDirectory?: string;
}

const jsonMaxBytes = 2 * 1024 * 1024;

/** The web application: every route of the table behind the same few middlewares. */
export function createApp(options: AppOptions): Express {
  const { routes, logger, clientDirectory, ...context } = options;
  const app = express();
  app.disable('x-powered-by');
  app.use(
    helmet({
      // On plain http an upgrade would point every asset at a port that doesn't speak TLS.
      contentSecurityPolicy: {
        directives: {
          'upgrade-insecure-requests': null,
          // Charts and overlays set style attributes.
          'style-src': ["'self'", "'unsafe-inline'"],
          'img-src': ["'self'", 'data:', 'blob:'],
        },
      },
      strictTransportSecurity: false,
    }),
  );
  app.use(
    pinoHttp({
      logger,
      customLogLevel: (_req, res, error) =>
        error || res.statusCode >= 500 ? 'error' : res.statusCode >= 400 ? 'info' : 'debug',
      serializers: {
        req: (req: { method: string; url: string }) => ({ method: req.method, url: req.url }),
        res: (res: { statusCode: number }) => ({ status: res.statusCode }),
      },
    }),
  );
  app.use(
    '/api/session',
    rateLimit({
      windowMs: 15 * 60 * 1000,
      limit: options.signInLimit,
      // A wrong present password counts like a wrong sign-in.
      skip: (req) => !(req.method === 'POST' && ['/', '/password'].includes(req.path)),
      skipSuccessfulRequests: true,
      standardHeaders: true,
      legacyHeaders: false,
      handler: (_req, _res, next) =>
        next(
          new AppError(
            'too_many_requests',
            'Too many wrong passwords from here. Wait a quarter of an hour and try again.',
          ),
        ),
    }),
  );
  app.use('/api', cookieParser(), express.json({ limit: jsonMaxBytes }), (_req, res, next) => {
    res.set('Cache-Control', 'no-store');
    next();
  });
  for (const route of routes) app[route.method](route.path, runRoute(route, context));
  app.use('/api', (_req, _res, next) =>
    next(new AppError('not_found', 'There is no such address.')),
  );
  if (clientDirectory !== undefined) serveClient(app, clientDirectory);
  app.use(errorAnswer(logger));
  return app;
}
