import { randomUUID } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** Page addresses whose last part is a secret. */
const SECRET_PATH = /^\/(invite|reset)\/[^/?#]+/;

/** The address as it may be logged: without query and without the secret of a link. */
export function loggedPath(url: string): string {
  return url.replace(/[?#].*$/s, '').replace(SECRET_PATH, '/$1/…');
}

/** One line a request: who, what, when, from where, how it ended. Headers and bodies are never logged. */
export function requestLog(logger: Logger) {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    serializers: {
      req: (request: { id: unknown; method: string; url: string; raw: IncomingMessage & { ip?: string } }) => ({
        id: request.id,
        method: request.method,
        path: loggedPath(request.raw.url === undefined ? request.url : originalUrl(request.raw)),
        from: request.raw.ip ?? request.raw.socket.remoteAddress,
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    customProps: (_request, response) => whoOf(response),
    customLogLevel: (_request, response, error) =>
      error || response.statusCode >= 500 ? 'error' : response.statusCode >= 400 ? 'warn' : 'info',
  });
}

function originalUrl(request: IncomingMessage & { originalUrl?: string }): string {
  return request.originalUrl ?? request.url ?? '';
}

interface Locals {
  readonly signedIn?: { readonly person: { readonly id: string } } | null;
  readonly account?: string;
}

function whoOf({ locals }: ServerResponse & { locals?: Locals }) {
  return { person: locals?.signedIn?.person.id, account: locals?.account };
}
