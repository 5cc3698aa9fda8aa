import { readAuthMessage } from 'y-protocols/auth';
import { messageAuth, WebsocketProvider } from 'y-websocket';
import * as Y from 'yjs';
import { OWN_EDIT, sheetMaps } from '#shared/doc/sheet-maps';
import { sendOwnPresenceOnly } from './own-awareness';
import { StoredChanges } from './stored-changes';

/** How the live connection stands, and whether what was drawn here is safe. */
export type RoomState =
  | { readonly kind: 'opening'; readonly unreachable: boolean }
  | { readonly kind: 'live'; readonly notStored: number }
  | { readonly kind: 'offline'; readonly notStored: number }
  | { readonly kind: 'refused'; readonly why: 'signed-out' | 'forbidden' | 'not-found' };

/** One person's end of a live sheet. */
export type Room = {
  readonly doc: Y.Doc;
  readonly awareness: WebsocketProvider['awareness'];
  readonly undo: Y.UndoManager;
  state(): RoomState;
  /** Calls back when the state changes; returns how to stop. */
  subscribe(listener: () => void): () => void;
  close(): void;
};

const REFUSALS: Readonly<Record<number, Extract<RoomState, { kind: 'refused' }>['why']>> = {
  4401: 'signed-out',
  4403: 'forbidden',
  4404: 'not-found',
};

/** Why the server dropped a change; its word for that begins with one of these. */
const DENIALS = ['not-allowed', 'archived', 'too-large'] as const;
export type Denial = (typeof DENIALS)[number];

/** Opens a sheet. `onDenied` is called when the server dropped a change made here. */
export function openRoom(sheetId: string, onDenied: (denial: Denial) => void): Room {
  const doc = new Y.Doc();
  const provider = new WebsocketProvider(syncAddress(), sheetId, doc, { connect: false, disableBc: true });
  sendOwnPresenceOnly(provider);
  provider.messageHandlers[messageAuth] = (_encoder, decoder) =>
    readAuthMessage(decoder, doc, (_doc, reason) =>
      onDenied(DENIALS.find((denial) => reason.startsWith(denial)) ?? 'not-allowed'),
    );
  const undo = new Y.UndoManager(Object.values(sheetMaps(doc)), {
    trackedOrigins: new Set([OWN_EDIT]),
    captureTimeout: 0,
  });

  const listeners = new Set<() => void>();
  let state: RoomState = { kind: 'opening', unreachable: false };
  let wasLive = false;
  let unreachable = false;
  const changed = () => {
    if (state.kind !== 'refused') {
      if (provider.synced) {
        wasLive = true;
        state = { kind: 'live', notStored: stored.notStored };
      } else state = wasLive ? { kind: 'offline', notStored: stored.notStored } : { kind: 'opening', unreachable };
    }
    for (const listener of listeners) listener();
  };
  const stored = new StoredChanges(provider, changed);
  provider.on('sync', changed);
  provider.on('status', changed);
  provider.on('connection-error', () => {
    unreachable = true;
    changed();
  });
  provider.on('closed', ({ code }) => {
    state = { kind: 'refused', why: REFUSALS[code] ?? 'forbidden' };
    changed();
  });
  // Deferred, so that a room opened and closed at once never opens a socket.
  const connecting = setTimeout(() => provider.connect(), 0);

  return {
    doc,
    awareness: provider.awareness,
    undo,
    state: () => state,
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    close() {
      clearTimeout(connecting);
      listeners.clear();
      undo.destroy();
      provider.destroy();
      doc.destroy();
    },
  };
}

function syncAddress(): string {
  const { protocol, host } = window.location;
  return `${protocol === 'https:' ? 'wss' : 'ws'}://${host}/sync`;
}
