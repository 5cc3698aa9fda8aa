import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';
import { writePermissionDenied } from 'y-protocols/auth';
import { type Awareness, encodeAwarenessUpdate } from 'y-protocols/awareness';
import {
  messageYjsSyncStep1,
  messageYjsSyncStep2,
  messageYjsUpdate,
  writeSyncStep1,
  writeSyncStep2,
  writeUpdate,
} from 'y-protocols/sync';
import type * as Y from 'yjs';

// The y-websocket protocol: a message's kind, then what y-protocols writes for that kind.
const SYNC = 0;
const AWARENESS = 1;
const AUTH = 2;
const QUERY_AWARENESS = 3;

/** One client's presence; a null state says it has gone. */
export interface Presence {
  readonly clientId: number;
  readonly clock: number;
  readonly state: Readonly<Record<string, unknown>> | null;
}

export type ClientMessage =
  | { readonly kind: 'sync-step-1'; readonly stateVector: Uint8Array }
  | { readonly kind: 'sync-step-2' | 'update'; readonly update: Uint8Array }
  | { readonly kind: 'awareness'; readonly presences: readonly Presence[] }
  | { readonly kind: 'query-awareness' };

/** Presences in one message: a client tells of itself, and may pass on what it heard of the others. */
const MOST_PRESENCES = 1000;
/** The highest clock taken: the server counts on from it, and beyond 2^53 nobody could read what it sends. */
const HIGHEST_CLOCK = 2 ** 32;

/** Reads a frame. Throws on anything that is not a message of the protocol. */
export function readMessage(frame: Uint8Array): ClientMessage {
  const decoder = decoding.createDecoder(frame);
  const kind = decoding.readVarUint(decoder);
  switch (kind) {
    case SYNC:
      return readSync(decoder);
    case AWARENESS:
      return { kind: 'awareness', presences: readPresences(decoding.readVarUint8Array(decoder)) };
    case QUERY_AWARENESS:
      return { kind: 'query-awareness' };
    default:
      throw new Error(`no message of kind ${kind}`);
  }
}

function readSync(decoder: decoding.Decoder): ClientMessage {
  const step = decoding.readVarUint(decoder);
  const content = decoding.readVarUint8Array(decoder);
  switch (step) {
    case messageYjsSyncStep1:
      return { kind: 'sync-step-1', stateVector: content };
    case messageYjsSyncStep2:
      return { kind: 'sync-step-2', update: content };
    case messageYjsUpdate:
      return { kind: 'update', update: content };
    default:
      throw new Error(`no sync step ${step}`);
  }
}

function readPresences(content: Uint8Array): Presence[] {
  const decoder = decoding.createDecoder(content);
  const count = decoding.readVarUint(decoder);
  if (count > MOST_PRESENCES) throw new Error(`${count} presences in one message`);
  return Array.from({ length: count }, () => {
    const clientId = decoding.readVarUint(decoder);
    const clock = decoding.readVarUint(decoder);
    if (clock > HIGHEST_CLOCK) throw new Error(`a presence at clock ${clock}`);
    const state: unknown = JSON.parse(decoding.readVarString(decoder));
    if (typeof state !== 'object' || Array.isArray(state)) throw new Error('a presence that is no object');
    return { clientId, clock, state: state && { ...state } };
  });
}

/** What the awareness protocol writes for these presences, to be applied to an `Awareness`. */
export function presenceUpdate(presences: readonly Presence[]): Uint8Array {
  return encoding.encode((encoder) => {
    encoding.writeVarUint(encoder, presences.length);
    for (const { clientId, clock, state } of presences) {
      encoding.writeVarUint(encoder, clientId);
      encoding.writeVarUint(encoder, clock);
      encoding.writeVarString(encoder, JSON.stringify(state));
    }
  });
}

function message(kind: number, write: (encoder: encoding.Encoder) => void): Uint8Array {
  return encoding.encode((encoder) => {
    encoding.writeVarUint(encoder, kind);
    write(encoder);
  });
}

/** Asks for what the other side has and this document lacks. */
export function askForMissing(doc: Y.Doc): Uint8Array {
  return message(SYNC, (encoder) => writeSyncStep1(encoder, doc));
}

/** Answers with what this document has and the other side lacks. */
export function tellMissing(doc: Y.Doc, stateVector: Uint8Array): Uint8Array {
  return message(SYNC, (encoder) => writeSyncStep2(encoder, doc, stateVector));
}

export function tellUpdate(update: Uint8Array): Uint8Array {
  return message(SYNC, (encoder) => writeUpdate(encoder, update));
}

export function tellPresence(awareness: Awareness, clientIds: readonly number[]): Uint8Array {
  return message(AWARENESS, (encoder) =>
    encoding.writeVarUint8Array(encoder, encodeAwarenessUpdate(awareness, [...clientIds])),
  );
}

/** The protocol's own word for a change that was not taken. */
export function tellRefused(reason: string): Uint8Array {
  return message(AUTH, (encoder) => writePermissionDenied(encoder, reason));
}
