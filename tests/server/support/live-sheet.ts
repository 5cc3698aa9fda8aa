import * as decoding from 'lib0/decoding';
import { expect, onTestFinished, vi } from 'vitest';
import { WebSocket } from 'ws';
import { WebsocketProvider } from 'y-websocket';
import * as Y from 'yjs';
import type { Running } from '../../../server/start';
import type { Visitor } from './visitor';

const MESSAGE_AUTH = 2;

/** Everything that a document's maps hold, as plain data. */
export function contentOf(doc: Y.Doc): Record<string, unknown> {
  const names = ['parts', 'places', 'params', 'wires', 'routes', 'sheet'];
  return Object.fromEntries(names.map((name) => [name, doc.getMap(name).toJSON()]));
}

/** A sheet open in somebody's browser: y-websocket's own client over a real socket that carries their cookie. */
export class LiveSheet {
  readonly doc = new Y.Doc();
  readonly provider: WebsocketProvider;
  /** What the server said of changes it did not take. */
  readonly refusals: string[] = [];
  /** Codes of the closes. */
  readonly closes: number[] = [];

  constructor(server: Pick<Running, 'url' | 'port'>, visitor: Visitor, sheetId: string, origin = server.url) {
    const headers = visitor.cookie === undefined ? {} : { cookie: visitor.cookie };
    class CookieSocket extends WebSocket {
      constructor(url: string | URL, protocols?: string[]) {
        super(url, protocols ?? [], { origin, headers });
      }
    }
    this.provider = new WebsocketProvider(`ws://127.0.0.1:${server.port}/sync`, sheetId, this.doc, {
      disableBc: true,
      // The package's own way in for Node; its type is the browser's.
      WebSocketPolyfill: CookieSocket as unknown as typeof globalThis.WebSocket,
      maxBackoffTime: 100,
    });
    this.provider.messageHandlers[MESSAGE_AUTH] = (_encoder, decoder) => {
      decoding.readVarUint(decoder);
      this.refusals.push(decoding.readVarString(decoder));
    };
    this.provider.on('connection-close', (event) => {
      if (event) this.closes.push(event.code);
    });
    onTestFinished(() => this.leave());
  }

  /** Resolves when the document is the server's. */
  async synced(): Promise<this> {
    await vi.waitFor(() => expect(this.provider.synced).toBe(true), { timeout: 5000 });
    return this;
  }

  get notes(): Y.Map<unknown> {
    return this.doc.getMap('sheet');
  }

  leave(): void {
    this.provider.destroy();
    this.doc.destroy();
  }
}

/** The raw socket, for frames that no client would send. */
export async function rawSocket(
  server: Pick<Running, 'url' | 'port'>,
  visitor: Visitor,
  sheetId: string,
): Promise<{ socket: WebSocket; closed: Promise<number> }> {
  const socket = new WebSocket(`ws://127.0.0.1:${server.port}/sync/${sheetId}`, {
    origin: server.url,
    headers: { cookie: visitor.cookie ?? '' },
  });
  onTestFinished(() => socket.terminate());
  const closed = new Promise<number>((resolve) => socket.on('close', resolve));
  await new Promise((resolve, reject) => {
    socket.on('open', resolve);
    socket.on('error', reject);
  });
  return { socket, closed };
}
