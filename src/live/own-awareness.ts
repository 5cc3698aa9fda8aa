import * as encoding from 'lib0/encoding';
import { encodeAwarenessUpdate } from 'y-protocols/awareness';
import { messageAwareness, type WebsocketProvider } from 'y-websocket';

type AwarenessChange = { added: number[]; updated: number[]; removed: number[] };

/**
 * Sends only this person's own presence. The provider's own handler also sends back everything it received, which among
 * N people makes N² messages.
 */
export function sendOwnPresenceOnly(provider: WebsocketProvider): void {
  const { awareness, doc } = provider;
  awareness.off('update', provider._awarenessUpdateHandler);
  provider._awarenessUpdateHandler = ({ added, updated, removed }: AwarenessChange) => {
    const own = [...added, ...updated, ...removed].filter((client) => client === doc.clientID);
    const { ws } = provider;
    if (own.length === 0 || ws === null || ws.readyState !== WebSocket.OPEN) return;
    const encoder = encoding.createEncoder();
    encoding.writeVarUint(encoder, messageAwareness);
    encoding.writeVarUint8Array(encoder, encodeAwarenessUpdate(awareness, own));
    ws.send(encoding.toUint8Array(encoder));
  };
  awareness.on('update', provider._awarenessUpdateHandler);
}
