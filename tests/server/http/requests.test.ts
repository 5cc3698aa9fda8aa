import { once } from 'node:events';
import { request } from 'node:http';
import { describe, expect, test } from 'vitest';
import { WebSocket } from 'ws';
import { errorAnswer } from '#shared/api/errors';
import { startTestServer, TestLog } from '../support/start-test-server';
import { codeOf, fieldsOf, PASSWORD, Visitor } from '../support/visitor';

const log = new TestLog();
const server = await startTestServer({ log: log.logger });
const ines = await new Visitor(server).signUp('Ines Rautio');

describe('a change', () => {
  const body = { name: 'Mooring' };

  test.each([
    ['our own page', { origin: server.url }, 201],
    ['our own page, by its numeric address', { origin: `http://127.0.0.1:${server.port}` }, 201],
    ['a browser that says so itself', { origin: '', 'sec-fetch-site': 'same-origin' }, 201],
    ['another site', { origin: 'https://elsewhere.example' }, 403],
    ['another port of this machine', { origin: `http://localhost:${server.port + 1}` }, 403],
    ['a page that hides where it is', { origin: 'null' }, 403],
    ['another site, by the browser’s word', { origin: '', 'sec-fetch-site': 'cross-site' }, 403],
    ['nowhere, with a cookie', { origin: '' }, 403],
  ])('from %s gets its answer', async (_from, headers, status) => {
    const given = Object.fromEntries(Object.entries(headers).filter(([, value]) => value !== ''));
    const answer = await raw('POST', '/api/teams', JSON.stringify(body), {
      ...given,
      cookie: ines.cookie ?? '',
      'content-type': 'application/json',
    });
    expect(answer.status).toBe(status);
    if (status === 403) expect(codeOf(answer)).toBe('foreign-origin');
  });

  test('from another site cannot sign anybody in', async () => {
    const stranger = new Visitor(server);
    const credentials = { email: 'ines.rautio@buoy.example', password: PASSWORD };
    const answer = await stranger.send('POST', '/api/sign-in', credentials, { origin: 'https://elsewhere.example' });
    expect([answer.status, stranger.cookie]).toEqual([403, undefined]);
  });

  test.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x'])(
    'sent as %s is refused',
    async (type) => {
      const answer = await ines.send('POST', '/api/teams', JSON.stringify(body), { 'content-type': type });
      expect([answer.status, codeOf(answer)]).toEqual([415, 'wrong-content-type']);
    },
  );

  test('that is not JSON is refused', async () => {
    const answer = await ines.send('POST', '/api/teams', '{"name": ');
    expect([answer.status, codeOf(answer)]).toEqual([400, 'malformed-json']);
  });

  test('without a body is refused', async () => {
    const answer = await ines.post('/api/teams');
    expect([answer.status, codeOf(answer)]).toEqual([400, 'malformed-request']);
  });

  test('nested beyond all sense is refused, whatever would read it', async () => {
    const deep = `${'['.repeat(100_000)}${']'.repeat(100_000)}`;
    for (const path of ['/api/operating-point', `/api/teams/${await ines.teamId()}/sheets`]) {
      const answer = await ines.send('POST', path, `{"name": "Deep", "circuit": ${deep}}`);
      expect([answer.status, codeOf(answer)]).toEqual([400, 'malformed-request']);
    }
  });

  test('larger than 1 MB is refused', async () => {
    const answer = await ines.post('/api/operating-point', { circuit: 'x'.repeat(1_048_577) });
    expect([answer.status, codeOf(answer)]).toEqual([413, 'too-large']);
  });

  test('cannot set what the server sets', async () => {
    for (const extra of ['id', 'role', 'teamId', 'author']) {
      const answer = await ines.post('/api/teams', { name: 'Mooring', [extra]: 'owner' });
      expect([answer.status, Object.keys(fieldsOf(answer))]).toEqual([422, [extra]]);
    }
  });

  test('cannot reach the prototype of anything', async () => {
    const answer = await ines.send('POST', '/api/teams', '{"name": "Mooring", "__proto__": {"role": "owner"}}');
    expect(answer.status).toBeLessThan(500);
    expect('role' in {}).toBe(false);
  });

  test('keeps a name with markup as the text that it is', async () => {
    const name = '<script>alert("x")</script>';
    const made = await ines.post('/api/teams', { name });
    expect(made.headers.get('content-type')).toContain('application/json');
    expect(JSON.stringify((await ines.get('/api/teams')).body)).toContain(JSON.stringify(name));
  });
});

describe('an answer', () => {
  test('from /api is kept by nobody on the way', async () => {
    expect((await ines.get('/api/me')).headers.get('cache-control')).toBe('no-store');
  });

  test('tells the browser to run and load nothing but our own', async () => {
    const { headers } = await ines.get('/api/me');
    const policy = headers.get('content-security-policy') ?? '';
    const directives = Object.fromEntries(policy.split(';').map((part) => part.trim().split(/ (.*)/s)));
    expect(directives).toMatchObject({
      'default-src': "'self'",
      'script-src': "'self'",
      'worker-src': "'self'",
      'style-src': "'self'",
      'object-src': "'none'",
      'base-uri': "'none'",
      'frame-ancestors': "'none'",
    });
    expect(directives['connect-src']).toContain(`ws://localhost:${server.port}`);
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('referrer-policy')).toBe('no-referrer');
    expect(headers.get('strict-transport-security')).toBeNull();
    expect(headers.get('x-powered-by')).toBeNull();
  });

  test('where there is nothing is a 404 in JSON', async () => {
    const answer = await ines.get('/api/nothing');
    expect([answer.status, codeOf(answer)]).toEqual([404, 'not-found']);
  });

  test('to an address that cannot be read is a 400', async () => {
    expect((await ines.get('/api/sheets/%E0%A4%A')).status).toBe(400);
  });

  test('after a fault of our own tells its id, and the log the rest', async () => {
    const broken = await startTestServer({ log: log.logger });
    const visitor = await new Visitor(broken).signUp('Samir Kade');
    const sheetId = await visitor.createSheet(await visitor.teamId());
    await broken.stop();
    const failing = await startTestServer({
      log: log.logger,
      openLog: () => () => ({
        load: () => {
          throw new Error('the disk is on fire');
        },
        append: () => undefined,
        compact: () => undefined,
      }),
    });
    const other = await new Visitor(failing).signUp('Samir Kade');
    const own = await other.createSheet(await other.teamId());
    expect(own).not.toBe(sheetId);
    const answer = await other.get(`/api/sheets/${own}/circuit`);
    const { code, message } = errorAnswer.parse(answer.body).error;
    expect([answer.status, code]).toEqual([500, 'internal']);
    expect(message).not.toContain('fire');
    const id = /[0-9a-f-]{36}/.exec(message)?.[0] ?? 'no id';
    expect(log.lines.some((line) => line.includes(id) && line.includes('the disk is on fire'))).toBe(true);
  });
});

describe('the log', () => {
  test('says who did what from where, and no secret', async () => {
    const token = await ines.invite(await ines.teamId(), 'viewer');
    await ines.post('/api/invitations/look-up', { token });
    await ines.get(`/invite/${token}`);
    await ines.signIn('Ines Rautio');
    const lines = log.lines.join('');
    for (const secret of [token, PASSWORD, ines.cookie?.split('=')[1] ?? '?']) expect(lines).not.toContain(secret);
    const line = log.lines.find((it) => it.includes('/api/invitations/look-up')) ?? '{}';
    expect(JSON.parse(line)).toMatchObject({
      person: ines.personId,
      req: { method: 'POST', path: '/api/invitations/look-up', from: '127.0.0.1' },
      res: { status: 200 },
    });
  });

  test('says whose account a sign-in was for, and no address of somebody unknown', async () => {
    const lineOf = async (name: string, password: string) => {
      await new Visitor(server).signIn(name, password);
      return JSON.parse(log.lines.findLast((line) => line.includes('"/api/sign-in"')) ?? '{}');
    };
    expect(await lineOf('Ines Rautio', 'not-the-password')).toMatchObject({
      account: ines.personId,
      res: { status: 401 },
    });
    const unknown = await lineOf('Nobody Here', 'not-the-password');
    expect(unknown.account).toMatch(/^unknown-[0-9a-f]{16}$/);
    expect((await lineOf('Nobody Here', 'another-guess')).account).toBe(unknown.account);
    expect((await lineOf('Someone Else', 'another-guess')).account).not.toBe(unknown.account);
    expect(log.lines.join('')).not.toContain('nobody.here');
  });

  test('names the same sender of a socket as of a request, whatever the proxies before them claim', async () => {
    const forwarded = '198.51.100.1, 203.0.113.7, 192.0.2.9';
    for (const [trustProxy, sender] of [
      [0, '127.0.0.1'],
      [1, '192.0.2.9'],
      [2, '203.0.113.7'],
      [9, '198.51.100.1'],
    ] as const) {
      const trusting = await startTestServer({ log: log.logger, trustProxy });
      const headers = { 'x-forwarded-for': forwarded, origin: trusting.url };
      await new Visitor(trusting).send('GET', '/api/me', undefined, headers);
      const socket = new WebSocket(`ws://127.0.0.1:${trusting.port}/sync/none`, { headers });
      await once(socket, 'close');
      const [asked, opened] = log.lines.slice(-2).map((line) => JSON.parse(line));
      expect([asked.req?.from, opened.from], `${trustProxy} proxies`).toEqual([sender, sender]);
    }
  });

  test('believes a forwarded address only where a proxy is trusted', async () => {
    const trusting = await startTestServer({ log: log.logger, trustProxy: 1 });
    const headers = { 'x-forwarded-for': '203.0.113.7' };
    await new Visitor(server).send('GET', '/api/me?untrusting', undefined, headers);
    await new Visitor(trusting).send('GET', '/api/teams', undefined, headers);
    const from = (path: string) => JSON.parse(log.lines.findLast((line) => line.includes(path)) ?? '{}').req.from;
    expect(from('"/api/teams"')).toBe('203.0.113.7');
    expect(from('"/api/me"')).toBe('127.0.0.1');
  });
});

test('the process and the database can be asked how they are', async () => {
  const visitor = new Visitor(server);
  expect((await visitor.get('/healthz')).status).toBe(200);
  expect((await visitor.get('/readyz')).status).toBe(200);
});

/** A request with exactly these headers; `fetch` would not leave out or forge some of them. */
function raw(method: string, path: string, body: string, headers: Record<string, string>) {
  return new Promise<{ status: number; headers: Headers; body: unknown }>((resolve, reject) => {
    const sent = request({ host: '127.0.0.1', port: server.port, method, path, headers }, (response) => {
      let text = '';
      response.on('data', (chunk) => {
        text += chunk;
      });
      response.on('end', () => {
        resolve({ status: response.statusCode ?? 0, headers: new Headers(), body: JSON.parse(text) });
      });
    });
    sent.on('error', reject);
    sent.end(body);
  });
}
