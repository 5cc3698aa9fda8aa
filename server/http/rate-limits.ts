import type { Request, RequestHandler, Response } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { Refusal } from '#shared/api/refusal';

/** At most so many calls a minute under one key; more are refused with the seconds to wait. */
export function perMinute(limit: number, key: (request: Request, response: Response) => string): RequestHandler {
  return rateLimit({
    windowMs: 60_000,
    limit,
    standardHeaders: false,
    legacyHeaders: false,
    keyGenerator: key,
    handler: () => {
      throw new Refusal('too-many', 'Too many requests: wait a minute.', { retryAfter: 60 });
    },
  });
}

/** One sender; a whole /56 counts as one for IPv6. */
export function byAddress(request: Request): string {
  return ipKeyGenerator(request.ip ?? '');
}
