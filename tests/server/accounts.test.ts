import { hash } from '@node-rs/argon2';
import { describe, expect, test } from 'vitest';
import { meAnswer } from '#shared/api/accounts';
import { hashToken } from '../../server/auth/tokens';
import { findPersonByEmail, setPasswordHash } from '../../server/db/queries/people';
import { sessions } from '../../server/db/schema';
import { startTestServer, TestClock } from './support/start-test-server';
import { codeOf, fieldsOf, PASSWORD, Visitor } from './support/visitor';

const HOUR = 3_600_000;
const clock = new TestClock();
const server = await startTestServer({ now: clock.now });
const { db } = server.context;

describe('signing up', () => {
  test('makes an account, a team of one’s own and a session', async () => {
    const visitor = await new Visitor(server).signUp('Ines Rautio');
    const me = meAnswer.parse((await visitor.get('/api/me')).body);
    expect(me.person).toEqual({ id: visitor.personId, name: 'Ines Rautio', email: 'ines.rautio@buoy.example' });
    expect(me.teams.map(({ name, role }) => [name, role])).toEqual([['Ines Rautio’s team', 'owner']]);
  });

  test('refuses an address that differs from a known one only in case', async () => {
    const reply = await new Visitor(server).post('/api/sign-up', {
      name: 'Another',
      email: 'INES.Rautio@Buoy.Example',
      password: PASSWORD,
    });
    expect([reply.status, codeOf(reply), Object.keys(fieldsOf(reply))]).toEqual([409, 'address-taken', ['email']]);
  });

  test.each([
    ['short', 'too short'],
    ['password1', 'among the commonest'],
    ['PASSWORD1', 'among the commonest, in capitals'],
    ['Marguerite', 'one’s own name'],
    ['harbour-2024', 'the address with a year'],
    ['x'.repeat(257), 'too long'],
  ])('refuses the password %s: %s', async (password) => {
    const body = { name: 'Marguerite Vik', email: 'm.harbour@buoy.example', password };
    const reply = await new Visitor(server).post('/api/sign-up', body);
    expect([reply.status, codeOf(reply), Object.keys(fieldsOf(reply))]).toEqual([422, 'invalid', ['password']]);
  });

  test('names every field that is wrong at once', async () => {
    const reply = await new Visitor(server).post('/api/sign-up', { name: ' ', email: 'nobody', password: 'short' });
    expect(Object.keys(fieldsOf(reply)).sort()).toEqual(['email', 'name', 'password']);
  });

  test('counts every character of a long password', async () => {
    const password = `${'harbour seal '.repeat(5)}1`;
    const body = { name: 'Long Word', email: 'long@buoy.example', password };
    expect((await new Visitor(server).post('/api/sign-up', body)).status).toBe(201);
    const other = await new Visitor(server).post('/api/sign-in', {
      email: body.email,
      password: `${password.slice(0, -1)}2`,
    });
    expect(other.status).toBe(401);
    const same = await new Visitor(server).post('/api/sign-in', { email: body.email, password });
    expect(same.status).toBe(200);
  });
});

describe('signing in', () => {
  test('says the same of an unknown address and of a wrong password', async () => {
    await new Visitor(server).signUp('Samir Kade');
    const wrong = await new Visitor(server).signIn('Samir Kade', 'not-the-password');
    const unknown = await new Visitor(server).signIn('Nobody Here', 'not-the-password');
    expect([wrong.status, wrong.body]).toEqual([unknown.status, unknown.body]);
    expect([wrong.status, codeOf(wrong)]).toEqual([401, 'wrong-credentials']);
  });

  test('starts a new session and ends the one that the browser had', async () => {
    const visitor = await new Visitor(server).signUp('Tove Bakken');
    const before = visitor.cookie;
    expect((await visitor.signIn('Tove Bakken')).status).toBe(200);
    expect(visitor.cookie).not.toBe(before);
    const old = new Visitor(server);
    old.cookie = before;
    expect((await old.get('/api/me')).status).toBe(401);
  });

  test('up starts a new session too, and ends the one that the browser had', async () => {
    const visitor = await new Visitor(server).signUp('First Account');
    const old = new Visitor(server);
    old.cookie = visitor.cookie;
    await visitor.signUp('Second Account');
    expect((await old.get('/api/me')).status).toBe(401);
    expect((await visitor.get('/api/me')).status).toBe(200);
  });

  test('makes a weak hash strong', async () => {
    const visitor = await new Visitor(server).signUp('Old Hand');
    const weak = await hash(PASSWORD, { memoryCost: 8192, timeCost: 1, parallelism: 1 });
    setPasswordHash(db, visitor.personId, weak);
    expect((await visitor.signIn('Old Hand')).status).toBe(200);
    expect(findPersonByEmail(db, 'old.hand@buoy.example')?.passwordHash).toMatch(
      /^\$argon2id\$v=19\$m=19456,t=2,p=1\$/,
    );
    expect((await visitor.signIn('Old Hand')).status).toBe(200);
  });
});

describe('sessions', () => {
  test('are dead on the server after signing out, wherever the cookie went', async () => {
    const visitor = await new Visitor(server).signUp('Runa Leclerc');
    const copy = new Visitor(server);
    copy.cookie = visitor.cookie;
    const out = await visitor.post('/api/sign-out');
    expect([out.status, visitor.cookie]).toEqual([204, undefined]);
    expect((await copy.get('/api/me')).status).toBe(401);
    expect((await visitor.post('/api/sign-out')).status).toBe(204);
  });

  test('are kept as a hash only', async () => {
    const visitor = await new Visitor(server).signUp('Hash Keeper');
    const token = visitor.cookie?.split('=')[1] ?? '';
    const ids = db
      .select({ id: sessions.id })
      .from(sessions)
      .all()
      .map(({ id }) => id);
    expect(ids).toContain(hashToken(token));
    expect(ids).not.toContain(token);
    expect(token.length).toBeGreaterThanOrEqual(26);
  });

  test('end three days after their last use', async () => {
    const visitor = await new Visitor(server).signUp('Idle Hand');
    clock.pass(71 * HOUR);
    expect((await visitor.get('/api/me')).status).toBe(200);
    clock.pass(71 * HOUR);
    expect((await visitor.get('/api/me')).status).toBe(200);
    clock.pass(73 * HOUR);
    expect((await visitor.get('/api/me')).status).toBe(401);
  });

  test('end thirty days after they were made, however much they are used', async () => {
    const visitor = await new Visitor(server).signUp('Busy Hand');
    for (let day = 0; day < 29; day += 2) {
      clock.pass(48 * HOUR);
      expect((await visitor.get('/api/me')).status, `day ${day + 2}`).toBe(day + 2 < 30 ? 200 : 401);
    }
  });
});

describe('the cookie', () => {
  test('is for the server alone', async () => {
    const reply = await new Visitor(server).post('/api/sign-up', {
      name: 'Plain Cookie',
      email: 'plain@buoy.example',
      password: PASSWORD,
    });
    const [cookie = ''] = reply.headers.getSetCookie();
    expect(cookie).toMatch(/^stillpoint=/);
    expect(cookie.split('; ')).toEqual(expect.arrayContaining(['HttpOnly', 'SameSite=Lax', 'Path=/']));
    expect(cookie).not.toContain('Secure');
  });

  test('is Secure and bound to the host over TLS, where HSTS is told too', async () => {
    const secure = await startTestServer({ publicUrl: 'https://stillpoint.buoy.example' });
    const reply = await new Visitor(secure).post('/api/sign-up', {
      name: 'Secure Cookie',
      email: 'secure@buoy.example',
      password: PASSWORD,
    });
    const [cookie = ''] = reply.headers.getSetCookie();
    expect(cookie).toMatch(/^__Host-stillpoint=/);
    expect(cookie.split('; ')).toEqual(expect.arrayContaining(['HttpOnly', 'SameSite=Lax', 'Path=/', 'Secure']));
    expect(cookie).not.toContain('Domain');
    expect(reply.headers.get('strict-transport-security')).toContain('max-age=');
  });
});
