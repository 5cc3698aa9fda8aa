import { type MeAnswer, signInBody, signUpBody } from '#shared/api/accounts';
import { parseBody } from '../http/parse';
import type { Route } from '../http/route';
import type { Context } from '../services/context';
import { listTeams } from '../services/list-teams';
import { signIn } from '../services/sign-in';
import { endSession } from '../services/sign-out';
import { signUp } from '../services/sign-up';

export function accountRoutes(ctx: Context): Route[] {
  return [
    {
      method: 'post',
      path: '/api/sign-up',
      access: 'public',
      perMinute: 60,
      handle: async ({ body, signedIn, note }) => {
        const { person, setCookie } = await signUp(ctx, parseBody(signUpBody, body), signedIn);
        note(person.id);
        return { status: 201, body: { person }, setCookie };
      },
    },
    {
      method: 'post',
      path: '/api/sign-in',
      access: 'public',
      handle: async ({ body, ...from }) => {
        const { person, setCookie } = await signIn(ctx, parseBody(signInBody, body), from);
        return { status: 200, body: { person }, setCookie };
      },
    },
    {
      // Public, so that signing out twice is no error.
      method: 'post',
      path: '/api/sign-out',
      access: 'public',
      handle: ({ signedIn }) => {
        if (signedIn) endSession(ctx, signedIn);
        return { status: 204, setCookie: ctx.sessions.blankCookie() };
      },
    },
    {
      method: 'get',
      path: '/api/me',
      access: 'signed-in',
      handle: ({ signedIn: { person } }) => {
        const answer: MeAnswer = { person, teams: listTeams(ctx, person.id) };
        return { status: 200, body: answer };
      },
    },
    {
      method: 'get',
      path: '/api/events',
      access: 'signed-in',
      handle: ({ signedIn }) => ({ events: (sink) => ctx.events.listen({ ...signedIn, ...sink }) }),
    },
  ];
}
