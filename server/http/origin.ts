import type { RequestHandler } from 'express';
import { Refusal } from '#shared/api/refusal';

/** The origins whose pages are our own. */
export type OwnOrigins = () => ReadonlySet<string>;

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Nothing changes on behalf of another site's page: a change must come from a page of our own, which browsers tell by
 * `Origin` or `Sec-Fetch-Site`. A request with neither header is no browser's, and is let through only where no
 * cookie could have been borrowed.
 */
export function requireOwnOrigin(ownOrigins: OwnOrigins, cookieName: string): RequestHandler {
  return (request, _response, next) => {
    const { origin, cookie } = request.headers;
    const site = request.headers['sec-fetch-site'];
    const foreign =
      origin === undefined ? site !== undefined || carries(cookie, cookieName) : !ownOrigins().has(origin);
    if (!SAFE.has(request.method) && site !== 'same-origin' && foreign) {
      throw new Refusal('foreign-origin', 'Changes are taken only from this server’s own pages.');
    }
    next();
  };
}

function carries(cookieHeader: string | undefined, name: string): boolean {
  return cookieHeader?.split(';').some((pair) => pair.trim().startsWith(`${name}=`)) ?? false;
}

/** A body that is not JSON is refused before it is read; so is one that a plain form could send. */
export const requireJson: RequestHandler = (request, _response, next) => {
  const { 'content-length': length = '0', 'transfer-encoding': encoding } = request.headers;
  // Browsers send `Content-Length: 0` with a change that has no body.
  const hasBody = encoding !== undefined || length !== '0';
  if (!SAFE.has(request.method) && hasBody && !request.is('application/json')) {
    throw new Refusal('wrong-content-type', 'Send application/json.');
  }
  next();
};
