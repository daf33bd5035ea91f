import express, { type Express } from 'express';
import helmet from 'helmet';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { sameOriginOnly } from './http/same-origin.ts';
import { noSuchOperation, problemHandler } from './http/problem.ts';
import { createRegister } from './http/route.ts';
import { registerRoutes } from './routes/index.ts';
import type { Parts } from './parts.ts';
import type { Services } from './services.ts';

/** The web application: API under /api, the built client everywhere else. */
export function createApp(services: Services, parts: Parts): Express {
  const { settings, log } = services;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', settings.production ? 1 : 'loopback');
  app.use(
    helmet({
      contentSecurityPolicy: {
        directives: {
          defaultSrc: ["'none'"],
          scriptSrc: ["'self'"],
          styleSrc: ["'self'"],
          styleSrcAttr: ["'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          fontSrc: ["'self'"],
          connectSrc: ["'self'"],
          manifestSrc: ["'self'"],
          workerSrc: ["'self'", 'blob:'],
          frameSrc: ["'self'"],
          formAction: ["'self'"],
          baseUri: ["'none'"],
          objectSrc: ["'none'"],
          frameAncestors: ["'self'"],
          upgradeInsecureRequests: settings.production ? [] : null,
        },
      },
      strictTransportSecurity: settings.production,
    }),
  );
  app.use('/api', sameOriginOnly(settings));
  const { register, finish } = createRegister(app, services);
  registerRoutes(register, services, parts);
  finish();
  app.use('/api', noSuchOperation);
  serveClient(app, settings.clientFolder);
  app.use(noSuchOperation);
  app.use(problemHandler(log));
  return app;
}

/** Built files by their name, for ever; every other address opens the client, which knows its own pages. */
function serveClient(app: Express, folder: string | null): void {
  if (!folder || !existsSync(join(folder, 'index.html'))) return;
  app.use('/assets', express.static(join(folder, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false }));
  app.use(express.static(folder, { index: false, maxAge: 0, setHeaders: (response) => response.setHeader('Cache-Control', 'no-cache') }));
  app.get('/{*page}', (_request, response) => {
    response.sendFile(join(folder, 'index.html'), { headers: { 'Cache-Control': 'no-cache' } });
  });
}
