import type { IncomingMessage, Server } from 'node:http';
import type { Duplex } from 'node:stream';
import type { Logger } from 'pino';
import { type WebSocket, WebSocketServer } from 'ws';
import { closeSocket, connect } from './connection';
import type { Opener } from './member';
import type { Admission, Admit, Rooms } from './rooms';
import { CLOSE } from './socket-codes';

/** The largest frame; a change may be half as large. */
const MAX_PAYLOAD = 2 * 1_048_576;
const PATH = /^\/sync\/([\w-]{1,64})$/;

export interface UpgradeDeps {
  readonly rooms: Rooms;
  readonly admit: Admit;
  readonly identify: (cookieHeader: string | undefined) => Promise<Opener | null>;
  /** Notes that the session is in use. */
  readonly touch: (sessionId: string) => void;
  readonly ownOrigins: () => ReadonlySet<string>;
  readonly senderAddress: (request: IncomingMessage) => string;
  readonly log: Logger;
  readonly now: () => number;
  /** Whether somebody else (Vite's hot reload) answers upgrades on other paths. */
  readonly shareUpgrades: boolean;
}

/**
 * Takes /sync/:sheetId. A refusal accepts the socket and closes it with its code, because a client cannot read an HTTP
 * status here and would try for ever.
 */
export function acceptSync(server: Server, deps: UpgradeDeps): void {
  const sockets = new WebSocketServer({ noServer: true, maxPayload: MAX_PAYLOAD, perMessageDeflate: false });
  server.on('upgrade', (request: IncomingMessage, stream: Duplex, head: Buffer) => {
    const path = (request.url ?? '').replace(/\?.*$/s, '');
    if (!path.startsWith('/sync/')) {
      if (!deps.shareUpgrades) stream.destroy();
      return;
    }
    stream.on('error', () => stream.destroy());
    deps.identify(request.headers.cookie).then(
      (signedIn) =>
        sockets.handleUpgrade(request, stream, head, (socket) => {
          // A broken or oversized frame is reported here; the socket closes itself.
          socket.on('error', (error) => deps.log.warn({ err: error }, 'a socket failed'));
          admitSocket(socket, request, PATH.exec(path)?.[1] ?? '', signedIn, deps);
        }),
      (error: unknown) => {
        deps.log.error({ err: error }, 'a socket could not be admitted');
        stream.destroy();
      },
    );
  });
}

function admitSocket(
  socket: WebSocket,
  request: IncomingMessage,
  sheetId: string,
  signedIn: Opener | null,
  deps: UpgradeDeps,
): void {
  const { log, rooms } = deps;
  const about = { sheet: sheetId, person: signedIn?.person.id, from: deps.senderAddress(request) };
  const admission = admissionOf(request.headers.origin, sheetId, signedIn, deps);
  if (!signedIn || !admission.admitted) {
    const { code, reason } = admission.admitted ? NOT_SIGNED_IN : admission;
    log.warn({ ...about, code }, `sheet not opened: ${reason}`);
    closeSocket(socket, code, reason);
    return;
  }
  const { person, sessionId } = signedIn;
  try {
    const room = rooms.open(sheetId);
    const { role, archived } = admission;
    connect(socket, { person, sessionId, role, archived }, room, {
      now: deps.now,
      beat: (member, active) => {
        try {
          if (active) deps.touch(sessionId);
          rooms.recheckMember(sheetId, room, member);
        } catch (error) {
          log.error({ ...about, err: error }, 'a session could not be looked up');
        }
      },
      puzzled: (error) => log.warn({ ...about, err: error }, 'a message could not be understood'),
      left: (member) => {
        log.info(about, 'sheet closed');
        rooms.leave(sheetId, room, member);
      },
    });
    log.info({ ...about, role }, 'sheet opened');
  } catch (error) {
    log.error({ ...about, err: error }, 'sheet could not be loaded');
    closeSocket(socket, CLOSE.tryLater, 'this sheet cannot be loaded now');
  }
}

const NOT_SIGNED_IN = { admitted: false, code: CLOSE.notSignedIn, reason: 'not signed in' } as const;

function admissionOf(
  origin: string | undefined,
  sheetId: string,
  signedIn: Opener | null,
  { admit, ownOrigins }: UpgradeDeps,
): Admission {
  if (!ownOrigins().has(origin ?? '')) {
    return { admitted: false, code: CLOSE.notAllowed, reason: 'not from our own pages' };
  }
  if (!signedIn) return NOT_SIGNED_IN;
  const admission = admit({ personId: signedIn.person.id, sessionId: signedIn.sessionId }, sheetId);
  // To an outsider another team's sheet is as absent as none.
  return !admission.admitted && admission.code === CLOSE.notAllowed
    ? { admitted: false, code: CLOSE.noSuchSheet, reason: 'no such sheet' }
    : admission;
}
