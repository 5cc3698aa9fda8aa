import express, { type Express, type Request, type RequestHandler, type Response } from 'express';
import { Refusal } from '#shared/api/refusal';
import type { Sessions, SignedIn } from '../auth/sessions';
import { answerErrors, noSuchRoute } from './error-answers';
import { sendEvents } from './event-stream';
import { type OwnOrigins, requireJson, requireOwnOrigin } from './origin';
import { byAddress, perMinute } from './rate-limits';
import type { Call, Route } from './route';

/** What one network address may send in all; several people may share it. */
const PER_ADDRESS = 6000;

/** Puts the routes under /api behind the checks that every one of them needs. */
export function mountRoutes(app: Express, routes: readonly Route[], sessions: Sessions, ownOrigins: OwnOrigins): void {
  app.use(
    '/api',
    (_request, response, next) => {
      response.set('Cache-Control', 'no-store');
      next();
    },
    perMinute(PER_ADDRESS, byAddress),
    requireOwnOrigin(ownOrigins, sessions.cookieName),
    requireJson,
    async (request, response, next) => {
      const signedIn: SignedIn | null = await sessions.identify(request.headers.cookie);
      response.locals.signedIn = signedIn;
      next();
    },
    express.json({ limit: '1mb' }),
  );
  for (const route of routes) {
    app[route.method](route.path, ...limits(route), async (request, response) => {
      const call = callOf(request, response);
      const { signedIn } = call;
      if (route.access === 'public') {
        send(response, await route.handle(call));
      } else {
        if (!signedIn) throw new Refusal('not-signed-in', 'Sign in first.');
        send(response, await route.handle({ ...call, signedIn }));
      }
    });
  }
  app.use('/api', noSuchRoute, answerErrors);
}

function limits({ perMinute: limit, access }: Route): RequestHandler[] {
  if (limit === undefined) return [];
  return [
    perMinute(limit, access === 'public' ? byAddress : (_request, response) => signedInOf(response)?.person.id ?? ''),
  ];
}

function signedInOf(response: Response): SignedIn | null {
  return response.locals.signedIn;
}

function callOf(request: Request, response: Response): Call {
  return {
    param: (name) => String(request.params[name]),
    body: request.body,
    address: request.ip ?? '',
    signedIn: signedInOf(response),
    note: (account) => {
      response.locals.account = account;
    },
  };
}

function send(response: Response, answer: Awaited<ReturnType<Route['handle']>>): void {
  if ('events' in answer) {
    sendEvents(response, answer.events);
    return;
  }
  if (answer.setCookie !== undefined) response.append('Set-Cookie', answer.setCookie);
  response.status(answer.status);
  if (answer.body === undefined) response.end();
  else response.json(answer.body);
}
