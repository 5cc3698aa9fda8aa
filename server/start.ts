import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import pino, { type Logger } from 'pino';
import { createApp, type Pages } from './app';
import { createSessions } from './auth/sessions';
import { hashToken } from './auth/tokens';
import type { Config } from './config';
import { openDatabase } from './db/connect';
import { migrateDatabase } from './db/migrate';
import { touchSession } from './db/queries/sessions';
import { appendUpdates, compactUpdates, endOfLog, loadUpdates } from './db/queries/sheet-log';
import { findSheet } from './db/queries/sheets';
import { createSessionAdapter } from './db/session-adapter';
import { prepareDemo } from './demo/prepare';
import { senderAddress } from './http/sender-address';
import { createAdmit, isLive } from './services/admit';
import type { Context } from './services/context';
import { createEvents } from './services/events';
import { keepHouse } from './services/housekeeping';
import { createListNews } from './services/list-news';
import { createStandings } from './services/standings';
import { tellTeam } from './services/tell-team';
import { createSolving } from './solving/solving';
import type { OpenLog } from './sync/log';
import { Rooms } from './sync/rooms';
import { acceptSync } from './sync/upgrade';

export interface Running {
  /** The address people type. */
  readonly url: string;
  readonly port: number;
  readonly context: Context;
  /** The demo's sign-ins, where there is a demo. */
  readonly demo: { readonly password: string; readonly people: readonly { email: string; role: string }[] } | undefined;
  /** Stores everything, sends everybody away, lets go of the port and the file. */
  stop(): Promise<void>;
}

/** What tests put in the place of the real thing. */
export interface Replacements {
  readonly now?: () => number;
  readonly log?: Logger;
  readonly openLog?: (real: OpenLog) => OpenLog;
}

const HOUR = 3_600_000;
/** How long requests under way may take when the server stops. */
const STOP_WITHIN = 5_000;

/** Opens the database, migrates it, and listens. */
export async function startServer(config: Config, replaced: Replacements = {}): Promise<Running> {
  const now = replaced.now ?? Date.now;
  const log = replaced.log ?? pino({ level: config.logLevel });
  const connection = openDatabase(config.databaseFile);
  const { db, sqlite } = connection;
  migrateDatabase(connection, 'drizzle');
  const demo = await prepareDemo(db, config, now);

  const server = createServer();
  const pages = await pagesFor(config, server);
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(config.port, config.host, resolve);
  });
  // From here to the handlers nothing waits, so that no request can come before them.
  const { port } = server.address() as AddressInfo;
  const local = ['localhost', '127.0.0.1', '[::1]'].map((host) => `http://${host}:${port}`);
  const url = config.publicUrl ?? `http://localhost:${port}`;
  const origins = new Set(config.publicUrl === undefined ? local : [config.publicUrl]);
  const tls = url.startsWith('https:');

  const openLog: OpenLog = (sheetId) => ({
    load: () => loadUpdates(db, sheetId),
    append: (updates) => appendUpdates(db, sheetId, updates, now()),
    compact: (state) => compactUpdates(db, sheetId, state),
  });
  const touch = (sessionId: string) => touchSession(db, sessionId, now());
  const admit = createAdmit(db, now);
  const sessions = createSessions({ adapter: createSessionAdapter(db, hashToken), touch, secure: tls, now });
  const events = createEvents((sessionId) => isLive(db, sessionId, now()));
  const listNews = createListNews({
    teamOf: (sheetId) => findSheet(db, sheetId)?.teamId,
    tell: (teamId) => tellTeam({ db, events }, teamId, { kind: 'sheets', teamId }),
    onError: (error) => log.error({ err: error }, 'a team could not be told that its list changed'),
  });
  const rooms = new Rooms({
    openLog: replaced.openLog?.(openLog) ?? openLog,
    admit,
    onError: (error, about) => log.error({ err: error, ...about }, 'a sheet could not be stored'),
    onStir: (sheetId) => listNews.ofSheet(sheetId),
  });
  const solving = createSolving();
  const standings = createStandings({
    rooms,
    solving,
    endOfLog: (sheetId) => endOfLog(db, sheetId),
    onError: (error, about) => log.error({ err: error, ...about }, 'a sheet could not be solved for the list'),
  });
  const context: Context = { db, now, sessions, rooms, solving, events, standings, listNews, publicUrl: () => url };

  const isReady = () => sqlite.open && sqlite.prepare('select 1').get() !== undefined;
  const { trustProxy } = config;
  server.on('request', createApp({ context, log, ownOrigins: () => origins, trustProxy, tls, pages, isReady }));
  acceptSync(server, {
    rooms,
    admit,
    touch,
    identify: (cookieHeader) => sessions.identify(cookieHeader),
    ownOrigins: () => origins,
    senderAddress: (request) => senderAddress(request, trustProxy),
    log,
    now,
    shareUpgrades: pages.from === 'vite',
  });
  const chores = setInterval(() => {
    try {
      keepHouse(db, now());
    } catch (error) {
      log.error({ err: error }, 'the hourly clearing up failed');
    }
  }, HOUR);

  return {
    url,
    port,
    context,
    demo,
    async stop() {
      clearInterval(chores);
      listNews.end();
      const closed = new Promise((resolve) => server.close(resolve));
      events.endAll();
      rooms.shutDown();
      server.closeIdleConnections();
      const deadline = setTimeout(() => server.closeAllConnections(), STOP_WITHIN);
      // Vite has sockets of its own on this server.
      await pages.close?.();
      await closed;
      clearTimeout(deadline);
      await solving.end();
      sqlite.close();
    },
  };
}

async function pagesFor(
  { mode }: Config,
  server: ReturnType<typeof createServer>,
): Promise<Pages & { close?: () => Promise<void> }> {
  if (mode !== 'dev') return { from: 'folder', folder: 'dist/client' };
  // Imported here so that a production install needs no Vite.
  const { createServer: createVite } = await import('vite');
  const vite = await createVite({ server: { middlewareMode: true, ws: { server } }, appType: 'spa' });
  return { from: 'vite', handle: vite.middlewares, close: () => vite.close() };
}
