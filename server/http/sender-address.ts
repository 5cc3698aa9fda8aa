import type { IncomingMessage } from 'node:http';

/**
 * The address of a request that Express does not see, such as one that opens a socket; the rule is that of Express's
 * `request.ip`: each trusted proxy has put the address before it at the end of `X-Forwarded-For`.
 */
export function senderAddress(request: IncomingMessage, trustProxy: number): string {
  const forwarded = String(request.headers['x-forwarded-for'] ?? '').split(',');
  const addresses = forwarded.map((address) => address.trim()).filter((address) => address !== '');
  const hops = [...addresses, request.socket.remoteAddress ?? ''].reverse();
  return hops[Math.min(trustProxy, hops.length - 1)] ?? '';
}
