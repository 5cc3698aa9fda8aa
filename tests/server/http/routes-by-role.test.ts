import { describe, expect, test } from 'vitest';
import type { Role } from '#shared/access/roles';
import { newId } from '../../../server/auth/tokens';
import { insertPerson } from '../../../server/db/queries/people';
import { insertMembership } from '../../../server/db/queries/teams';
import { allRoutes } from '../../../server/routes/all-routes';
import { createSheet } from '../../../server/services/create-sheet';
import { invite } from '../../../server/services/invite';
import { startTestServer } from '../support/start-test-server';
import { Visitor } from '../support/visitor';

const CALLERS = ['nobody', 'outsider', 'viewer', 'reviewer', 'designer', 'owner'] as const;
type Caller = (typeof CALLERS)[number];

interface Row {
  /** The status for each caller, in the order of CALLERS. */
  readonly expected: readonly number[];
  readonly body?: (things: Things) => unknown;
}

/** What a route is asked about, made anew for each call so that no call can spoil the next. */
interface Things {
  readonly teamId: string;
  readonly sheetId: string;
  readonly personId: string;
  readonly invitationId: string;
  readonly token: string;
}

const EMPTY_CIRCUIT = { format: 'stillpoint.circuit', version: 1, ground: 'gnd', parts: [] };

/** Every route by every caller. A route that is missing here fails the test below. */
const TABLE: Record<string, Row> = {
  'post /api/sign-up': { expected: [422, 422, 422, 422, 422, 422], body: () => ({}) },
  'post /api/sign-in': { expected: [422, 422, 422, 422, 422, 422], body: () => ({}) },
  'post /api/sign-out': { expected: [204, 204, 204, 204, 204, 204] },
  'get /api/me': { expected: [401, 200, 200, 200, 200, 200] },
  'get /api/events': { expected: [401, 200, 200, 200, 200, 200] },
  'get /api/teams': { expected: [401, 200, 200, 200, 200, 200] },
  'post /api/teams': { expected: [401, 201, 201, 201, 201, 201], body: () => ({ name: 'Mooring' }) },
  'get /api/teams/:teamId/members': { expected: [401, 404, 200, 200, 200, 200] },
  'patch /api/teams/:teamId/members/:personId': {
    expected: [401, 404, 403, 403, 403, 200],
    body: () => ({ role: 'viewer' }),
  },
  'delete /api/teams/:teamId/members/:personId': { expected: [401, 404, 403, 403, 403, 204] },
  'get /api/teams/:teamId/invitations': { expected: [401, 404, 403, 403, 403, 200] },
  'post /api/teams/:teamId/invitations': {
    expected: [401, 404, 403, 403, 403, 201],
    body: () => ({ role: 'viewer' }),
  },
  'delete /api/invitations/:invitationId': { expected: [401, 404, 403, 403, 403, 204] },
  'post /api/invitations/look-up': {
    expected: [200, 200, 200, 200, 200, 200],
    body: ({ token }) => ({ token }),
  },
  // Whoever is in the team already cannot join it.
  'post /api/invitations/accept': { expected: [401, 200, 409, 409, 409, 409], body: ({ token }) => ({ token }) },
  'get /api/teams/:teamId/sheets': { expected: [401, 404, 200, 200, 200, 200] },
  'post /api/teams/:teamId/sheets': {
    expected: [401, 404, 403, 403, 201, 201],
    body: () => ({ name: 'Input pair' }),
  },
  'get /api/sheets/:sheetId': { expected: [401, 404, 200, 200, 200, 200] },
  'patch /api/sheets/:sheetId': { expected: [401, 404, 403, 403, 200, 200], body: () => ({ name: 'Renamed' }) },
  'delete /api/sheets/:sheetId': { expected: [401, 404, 403, 403, 403, 204] },
  'get /api/sheets/:sheetId/circuit': { expected: [401, 404, 200, 200, 200, 200] },
  'get /api/sheets/:sheetId/operating-point': { expected: [401, 404, 200, 200, 200, 200] },
  'post /api/operating-point': {
    expected: [401, 422, 422, 422, 422, 422],
    body: () => ({ circuit: EMPTY_CIRCUIT }),
  },
};

const server = await startTestServer();
const routes = allRoutes(server.context).map(({ method, path }) => `${method} ${path}`);

test('every route is in the table, and nothing else', () => {
  expect(Object.keys(TABLE).sort()).toEqual([...routes].sort());
});

const ines = await new Visitor(server).signUp('Ines Rautio');
const teamId = await ines.teamId();
const owner = { id: ines.personId, name: 'Ines Rautio', email: 'ines.rautio@buoy.example' };

describe.each(CALLERS.map((caller, index) => ({ caller, index })))('$caller', ({ caller, index }) => {
  test.each(routes)('%s', async (route) => {
    const things = makeThings();
    const visitor = await arrive(caller);
    const [method = '', pattern = ''] = route.split(' ');
    const path = pattern.replace(/:(\w+)/g, (_, name: keyof Things) => things[name]);
    const status = route.endsWith('/events')
      ? await statusOfStream(path, visitor)
      : (await visitor.send(method.toUpperCase(), path, TABLE[route]?.body?.(things))).status;
    expect(status).toBe(TABLE[route]?.expected[index]);
  });
});

test('copying a sheet is for those who may edit the team’s sheets, and only of a sheet they may open', async () => {
  const { sheetId } = makeThings();
  const copy = async (caller: Caller) =>
    (await (await arrive(caller)).post(`/api/teams/${teamId}/sheets`, { name: 'Copy', copyOf: sheetId })).status;
  expect(await Promise.all(CALLERS.map(copy))).toEqual([401, 404, 403, 403, 201, 201]);

  const odd = await new Visitor(server).signUp('Odd Utne');
  const elsewhere = await odd.teamId();
  expect((await odd.post(`/api/teams/${elsewhere}/sheets`, { name: 'Copy', copyOf: sheetId })).status).toBe(404);
});

test('archiving is for owners, though designers may rename', async () => {
  const { sheetId } = makeThings();
  expect((await (await arrive('designer')).patch(`/api/sheets/${sheetId}`, { archived: true })).status).toBe(403);
  expect((await (await arrive('owner')).patch(`/api/sheets/${sheetId}`, { archived: true })).status).toBe(200);
});

/** A person who has just signed in, made in the database so that no password need be hashed. */
async function arrive(caller: Caller): Promise<Visitor> {
  const visitor = new Visitor(server);
  if (caller === 'nobody') return visitor;
  visitor.personId = makePerson(caller === 'outsider' ? undefined : caller);
  visitor.cookie = (await server.context.sessions.open(visitor.personId)).split(';')[0];
  return visitor;
}

function makePerson(role: Role | undefined): string {
  const id = newId();
  const { db } = server.context;
  insertPerson(db, { id, name: 'Somebody', email: `${id}@buoy.example`, passwordHash: 'none', createdAt: 0 });
  if (role) insertMembership(db, { teamId, personId: id, role, joinedAt: 0 });
  return id;
}

/** By the use cases themselves: the routes would say that these are too many in a minute. */
function makeThings(): Things {
  const { invitation, link } = invite(server.context, teamId, { role: 'viewer' }, owner);
  return {
    teamId,
    sheetId: createSheet(server.context, teamId, { name: 'Input pair' }, owner.id).sheet.id,
    personId: makePerson('reviewer'),
    invitationId: invitation.id,
    token: link.split('/').at(-1) ?? '',
  };
}

/** The status of an answer that does not end by itself. */
async function statusOfStream(path: string, visitor: Visitor): Promise<number> {
  const abort = new AbortController();
  const response = await fetch(`http://127.0.0.1:${server.port}${path}`, {
    headers: { cookie: visitor.cookie ?? '' },
    signal: abort.signal,
  });
  abort.abort();
  return response.status;
}
