import { resolve } from 'node:path';
import express, { type Express, type RequestHandler } from 'express';
import type { Logger } from 'pino';
import { answerErrors } from './http/error-answers';
import { mountRoutes } from './http/mount-routes';
import type { OwnOrigins } from './http/origin';
import { requestLog } from './http/request-log';
import { securityHeaders } from './http/security-headers';
import { allRoutes } from './routes/all-routes';
import type { Context } from './services/context';

/** Where the pages come from: a built folder, Vite while developing, or nowhere when only the interface is wanted. */
export type Pages =
  | { readonly from: 'folder'; readonly folder: string }
  | { readonly from: 'vite'; readonly handle: RequestHandler }
  | { readonly from: 'nowhere' };

export interface AppDeps {
  readonly context: Context;
  readonly log: Logger;
  readonly ownOrigins: OwnOrigins;
  readonly trustProxy: number;
  readonly tls: boolean;
  readonly pages: Pages;
  /** Whether the database answers. */
  readonly isReady: () => boolean;
}

/** The whole HTTP side. It listens nowhere: the caller does. */
export function createApp({ context, log, ownOrigins, trustProxy, tls, pages, isReady }: AppDeps): Express {
  const app = express();
  app.set('trust proxy', trustProxy);
  app.disable('x-powered-by');
  app.use(requestLog(log));
  // Vite's hot reload runs inline scripts, on the developer's own machine only.
  if (pages.from !== 'vite')
    app.use(securityHeaders({ tls, socketOrigins: [...ownOrigins()].map(socketOrigin).filter(isPolicySource) }));
  app.get('/healthz', (_request, response) => {
    response.json({ status: 'alive' });
  });
  app.get('/readyz', (_request, response) => {
    const ready = isReady();
    response.status(ready ? 200 : 503).json({ status: ready ? 'ready' : 'not ready' });
  });
  mountRoutes(app, allRoutes(context), context.sessions, ownOrigins);
  if (pages.from === 'vite') app.use(pages.handle);
  if (pages.from === 'folder') servePages(app, pages.folder);
  app.use(answerErrors);
  return app;
}

function servePages(app: Express, folder: string): void {
  // Names of assets hold a hash of their content.
  app.use('/assets', express.static(resolve(folder, 'assets'), { immutable: true, maxAge: '1y', index: false }));
  app.use('/assets', (_request, response) => {
    response.status(404).end();
  });
  app.use(express.static(folder, { index: false, maxAge: 0 }));
  app.get('/{*path}', (_request, response) => {
    response.set('Cache-Control', 'no-cache').sendFile('index.html', { root: resolve(folder) });
  });
}

/** A content security policy knows no IPv6 addresses; browsers warn of one and ignore it. */
function isPolicySource(origin: string): boolean {
  return !origin.includes('[');
}

function socketOrigin(origin: string): string {
  return origin.replace(/^http/, 'ws');
}
