import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';
import { messageYjsSyncStep2, writeSyncStep1 } from 'y-protocols/sync';
import { messageSync, type WebsocketProvider } from 'y-websocket';

/**
 * Counts this person's changes that the server has not yet stored. The protocol has no receipt for an update, but
 * messages of one connection are answered in order and the server answers sync step 1 only when everything before it is
 * in its database: so one step 1 behind the changes, and its answer is the receipt.
 */
export class StoredChanges {
  #notStored = 0;
  /** Changes covered by the receipt that is on its way, or undefined when none was asked for. */
  #asked: number | undefined;
  readonly #provider: WebsocketProvider;
  readonly #onChange: () => void;

  constructor(provider: WebsocketProvider, onChange: () => void) {
    this.#provider = provider;
    this.#onChange = onChange;
    provider.doc.on('update', (_update: Uint8Array, origin: unknown) => {
      if (origin === provider) return;
      this.#notStored += 1;
      onChange();
      this.#ask();
    });
    provider.on('status', ({ status }) => {
      if (status !== 'connected') this.#asked = undefined;
    });
    provider.on('sync', (synced) => {
      if (synced) this.#ask();
    });
    const readSync = provider.messageHandlers[messageSync];
    if (!readSync) throw new Error('y-websocket has no handler for sync messages');
    provider.messageHandlers[messageSync] = (encoder, decoder, ...rest) => {
      const kind = decoding.peekVarUint(decoder);
      // The first answer of a connection makes it synced and so asks for a receipt; it is none itself.
      const asked = this.#asked;
      readSync(encoder, decoder, ...rest);
      if (kind === messageYjsSyncStep2 && asked !== undefined) this.#receipt(asked);
    };
  }

  get notStored(): number {
    return this.#notStored;
  }

  #ask(): void {
    const { ws, synced, doc } = this.#provider;
    if (this.#asked !== undefined || this.#notStored === 0 || !synced || ws?.readyState !== WebSocket.OPEN) return;
    this.#asked = this.#notStored;
    // Behind the provider's own listener, which sends the change itself.
    queueMicrotask(() => {
      if (ws.readyState !== WebSocket.OPEN) return;
      const encoder = encoding.createEncoder();
      encoding.writeVarUint(encoder, messageSync);
      writeSyncStep1(encoder, doc);
      ws.send(encoding.toUint8Array(encoder));
    });
  }

  #receipt(asked: number): void {
    this.#notStored -= asked;
    this.#asked = undefined;
    this.#onChange();
    this.#ask();
  }
}
