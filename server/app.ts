import express, { type Express } from 'express';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import type { AppContext } from './context.ts';
import { serveClient } from './http/client-files.ts';
import { errorHandler } from './http/error-handler.ts';
import { contentSecurityPolicy } from './http/content-security.ts';
import { healthRoute } from './http/health.ts';
import { requestNotFound } from './http/http.errors.ts';
import { mountRoutes } from './http/mount.ts';
import type { Route } from './http/registry.ts';
import { sameOrigin } from './http/same-origin.ts';
import { openSessions } from './http/session.ts';
import { loadViewer } from './people/load-viewer.ts';
import { makeSignIn, type SignIn } from './people/sign-in.ts';
import { allRoutes } from './routes.ts';

declare module 'express-serve-static-core' {
  interface Locals {
    signIn: SignIn;
    routes: readonly Route[];
  }
}

export interface App {
  express: Express;
  close: () => Promise<void>;
}

/** Puts the middleware in order, then every registered route, then the client. */
export function makeApp(ctx: AppContext): App {
  const app = express();
  const sessions = openSessions(ctx);
  const signIn = makeSignIn(ctx);
  app.locals.signIn = signIn;
  app.locals.routes = allRoutes;
  app.disable('x-powered-by');
  // Answers are never stored; what two people edit carries its version as its tag.
  app.set('etag', false);
  app.set('trust proxy', ctx.settings.secureCookies ? 1 : false);

  app.use(pinoHttp({ logger: ctx.log, serializers: quietSerializers, autoLogging: { ignore: isQuiet } }));
  app.use(
    helmet({
      contentSecurityPolicy: contentSecurityPolicy(ctx.settings),
      referrerPolicy: { policy: 'same-origin' },
      // These speak to browsers and plug-ins that are long gone.
      xDnsPrefetchControl: false,
      xDownloadOptions: false,
      xPermittedCrossDomainPolicies: false,
      xXssProtection: false,
    }),
  );
  app.get('/healthz', healthRoute(ctx));

  app.use('/api', sameOrigin(ctx.settings.publicUrl, ['/stripe/webhook']));
  app.use('/api', sessions.middleware, signIn.middleware, loadViewer(ctx));
  app.use(mountRoutes(allRoutes, ctx));
  app.use('/api', () => {
    throw requestNotFound();
  });
  app.use(serveClient());
  app.use(errorHandler(ctx.log));
  return { express: app, close: sessions.close };
}

/** A log line names the request and never what stood in it. */
const quietSerializers = {
  req: (request: { method: string; url: string }) => ({ method: request.method, path: request.url.split('?')[0] }),
  res: (response: { statusCode: number }) => ({ status: response.statusCode }),
};

function isQuiet(request: { url?: string | undefined }): boolean {
  return request.url === '/healthz' || !request.url?.startsWith('/api');
}
