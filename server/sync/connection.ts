import type { RawData, WebSocket } from 'ws';
import type { Member } from './member';
import { readMessage } from './messages';
import type { Room } from './room';
import { CLOSE, type CloseCode } from './socket-codes';

/** Messages a second in the long run, and in one burst; a long one counts as one for each of its parts of this length. */
const RATE = 200;
const BURST = 600;
const PART = 16_384;
/** Bytes that may wait for a slow reader. */
const MOST_BUFFERED = 8 * 1_048_576;
const PING_EVERY = 25_000;
/** How long the other side may take to answer a ping or a close. */
const GRACE = 8_000;

export interface ConnectionHooks {
  now(): number;
  /** Once per ping; `active` tells whether the person did anything since the last one. */
  beat(member: Member, active: boolean): void;
  /** What they sent could not be understood. */
  puzzled(error: unknown): void;
  left(member: Member): void;
}

/**
 * Joins a socket to a room, within bounds: a flood, a reader that does not read, a line that is dead or a frame that
 * is garbage ends this socket and no other.
 */
export function connect(
  socket: WebSocket,
  who: Pick<Member, 'person' | 'sessionId' | 'role' | 'archived'>,
  room: Room,
  hooks: ConnectionHooks,
): void {
  const member: Member = {
    ...who,
    send(message) {
      if (socket.readyState !== socket.OPEN) return;
      if (socket.bufferedAmount > MOST_BUFFERED) member.close(CLOSE.tryLater, 'too slow a reader');
      else socket.send(message);
    },
    close: (code, reason) => closeSocket(socket, code, reason),
  };
  const withinRate = createBucket(hooks.now);
  let active = false;

  socket.on('message', (data, isBinary) => {
    if (socket.readyState !== socket.OPEN) return;
    const frame = bytesOf(data);
    if (!withinRate(Math.max(1, frame.byteLength / PART))) {
      member.close(CLOSE.tryLater, 'too many messages');
      return;
    }
    if (!isBinary) {
      member.close(CLOSE.notBinary, 'binary frames only');
      return;
    }
    try {
      const message = readMessage(frame);
      active ||= message.kind === 'update';
      room.receive(member, message);
    } catch (error) {
      hooks.puzzled(error);
      member.close(CLOSE.garbage, 'not a message of the protocol');
    }
  });

  let deadline: NodeJS.Timeout | undefined;
  const heartbeat = setInterval(() => {
    hooks.beat(member, active);
    active = false;
    socket.ping();
    deadline = setTimeout(() => socket.terminate(), GRACE);
  }, PING_EVERY);
  socket.on('pong', () => clearTimeout(deadline));
  socket.on('close', () => {
    clearInterval(heartbeat);
    clearTimeout(deadline);
    hooks.left(member);
  });
  room.join(member);
}

/** Closes, and does not wait for ever for the other side to agree. */
export function closeSocket(socket: WebSocket, code: CloseCode, reason: string): void {
  socket.close(code, reason);
  const timer = setTimeout(() => socket.terminate(), GRACE);
  socket.on('close', () => clearTimeout(timer));
}

function bytesOf(data: RawData): Uint8Array {
  if (Array.isArray(data)) return Buffer.concat(data);
  return data instanceof ArrayBuffer ? new Uint8Array(data) : data;
}

/** Whether a message of this weight is within the rate; it counts either way. */
function createBucket(now: () => number): (weight: number) => boolean {
  let tokens = BURST;
  let last = now();
  return (weight) => {
    const at = now();
    tokens = Math.min(BURST, tokens + ((at - last) / 1000) * RATE);
    last = at;
    tokens -= weight;
    return tokens >= 0;
  };
}
