import compression from 'compression';
import express, { type Express, type Request } from 'express';
import helmet from 'helmet';
import { toNodeHandler } from 'better-auth/node';
import type { Auth } from './auth';
import { readActor } from './auth';
import type { Context } from './context';
import { errorHandler } from './errorHandler';
import { AppError } from './errors';
import { requestLogger } from './logger';
import { routes } from './routes/index';
import { mountRoutes } from './routing';
import { serveClient } from './webClient';

/** A form on another site cannot act in our visitor's name: what changes something comes from our own pages or from a program. */
function refuseForeignOrigin(context: Context): express.RequestHandler {
  const own = new URL(context.config.appUrl).origin;
  return (request, _response, next) => {
    const origin = request.headers.origin;
    const changes = !['GET', 'HEAD', 'OPTIONS'].includes(request.method);
    if (changes && origin !== undefined && origin !== own && request.headers.cookie !== undefined) {
      throw new AppError('not-allowed', 'This request came from a page of another site.');
    }
    next();
  };
}

/** better-auth says when to try again in a header of its own; clients look for the standard one. */
const sayRetryAfter: express.RequestHandler = (_request, response, next) => {
  const setHeader = response.setHeader.bind(response);
  response.setHeader = (name, value) => setHeader(name.toLowerCase() === 'x-retry-after' ? 'Retry-After' : name, value);
  next();
};

/** Builds the application without listening, so that tests mount it on a port of their own. */
export function buildApp(context: Context, auth: Auth): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', 'loopback');
  app.set('query parser', 'simple');
  app.use(requestLogger(context.logger));
  app.use(
    helmet({
      contentSecurityPolicy: {
        directives: {
          defaultSrc: ["'self'"],
          scriptSrc: ["'self'"],
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          fontSrc: ["'self'", 'data:'],
          connectSrc: ["'self'"],
          frameAncestors: ["'none'"],
          objectSrc: ["'none'"],
          upgradeInsecureRequests: null,
        },
      },
      strictTransportSecurity: context.config.appUrl.startsWith('https://'),
    }),
  );
  app.use(compression());
  app.use((request, _response, next) => {
    // better-auth reads its limits by this header; what a client claims of itself is dropped.
    request.headers['x-client-ip'] = request.ip ?? '';
    delete request.headers['x-forwarded-for'];
    next();
  });
  app.use('/api', (_request, response, next) => {
    response.setHeader('Cache-Control', 'no-store');
    next();
  });
  app.use('/api', refuseForeignOrigin(context));
  // Read here as text and handed on as it is: better-auth itself reads bodies of any size.
  app.use('/api/auth', express.text({ type: () => true, limit: '64kb' }), sayRetryAfter);
  app.all('/api/auth/*splat', toNodeHandler(auth));
  app.use('/api', express.json({ limit: '2mb' }));
  mountRoutes(app, routes, context, (request: Request) => readActor(context, auth, request.headers));
  serveClient(app, context.config.webDist);
  app.use(errorHandler);
  return app;
}
