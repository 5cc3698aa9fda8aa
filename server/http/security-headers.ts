import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** The browser is told to run, load and reach nothing but this server's own, and to show it in no other site's frame. */
export function securityHeaders(site: {
  readonly tls: boolean;
  readonly socketOrigins: readonly string[];
}): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        workerSrc: ["'self'"],
        // Not every browser counts ws: of the same host as 'self'.
        connectSrc: ["'self'", ...site.socketOrigins],
        imgSrc: ["'self'", 'data:'],
        styleSrc: ["'self'"],
        // React Flow places its nodes by style attributes, which run nothing.
        styleSrcAttr: ["'unsafe-inline'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(site.tls && { upgradeInsecureRequests: [] }),
      },
    },
    referrerPolicy: { policy: 'no-referrer' },
    strictTransportSecurity: site.tls ? { maxAge: 31_536_000 } : false,
  });
}
