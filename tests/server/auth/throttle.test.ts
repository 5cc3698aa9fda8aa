import { describe, expect, test } from 'vitest';
import { type Attempt, WINDOW, waitBeforeSignIn } from '../../../server/auth/throttle';
import { newDatabaseFile, startTestServer, TestClock } from '../support/start-test-server';
import { codeOf, Visitor } from '../support/visitor';

describe('the wait before signing in', () => {
  const OWNER = '192.0.2.1';
  const now = 10 * WINDOW;

  /** Tries as fast as is allowed for one hour and counts the failures. */
  function failuresInAnHour(addresses: readonly string[], known: readonly string[]): number {
    const attempts: Attempt[] = [];
    for (let at = now; at < now + WINDOW; at += 1000) {
      for (const address of addresses) {
        const recent = attempts.filter((it) => it.at > at - WINDOW);
        const wait = waitBeforeSignIn({
          now: at,
          address,
          knownAddresses: new Set(known),
          onAccount: recent,
          failuresFromAddress: recent.filter((it) => it.address === address),
        });
        if (wait <= 0) attempts.unshift({ address, succeeded: false, at });
      }
    }
    return attempts.length;
  }

  test('lets at most 100 failures an hour on an account pass, from however many addresses', () => {
    const strangers = Array.from({ length: 60 }, (_, i) => `198.51.100.${i}`);
    expect(failuresInAnHour([...strangers, OWNER], [OWNER])).toBe(100);
  });

  test('never lets strangers lock the owner out', () => {
    const onAccount = Array.from({ length: 80 }, (_, i) => ({
      address: `198.51.100.${i}`,
      succeeded: false,
      at: now - i,
    }));
    const question = { now, onAccount, failuresFromAddress: [] };
    const knownAddresses = new Set([OWNER]);
    expect(waitBeforeSignIn({ ...question, address: OWNER, knownAddresses })).toBe(0);
    expect(waitBeforeSignIn({ ...question, address: '203.0.113.9', knownAddresses })).toBeGreaterThan(0);
  });

  test('slows one address that tries many accounts', () => {
    const failuresFromAddress = Array.from({ length: 200 }, () => ({ address: OWNER, succeeded: false, at: now - 1 }));
    const wait = waitBeforeSignIn({
      now,
      address: OWNER,
      knownAddresses: new Set(),
      onAccount: [],
      failuresFromAddress,
    });
    expect(wait).toBe(WINDOW - 1);
  });
});

describe('guessing a password', () => {
  test('takes longer and longer, says how long, and is forgotten once the owner got in', async () => {
    const clock = new TestClock();
    const server = await startTestServer({ now: clock.now });
    const visitor = await new Visitor(server).signUp('Ines Rautio');
    for (let i = 0; i < 5; i += 1) expect((await visitor.signIn('Ines Rautio', 'a wrong one')).status).toBe(401);
    const waits: number[] = [];
    for (let i = 0; i < 8; i += 1) {
      const refused = await visitor.signIn('Ines Rautio');
      expect([refused.status, codeOf(refused)]).toEqual([429, 'too-many']);
      const seconds = Number(refused.headers.get('retry-after'));
      waits.push(seconds);
      clock.pass(seconds * 1000);
      expect((await visitor.signIn('Ines Rautio', 'a wrong one')).status).toBe(401);
    }
    expect(waits).toEqual([1, 2, 4, 8, 16, 32, 60, 60]);
    clock.pass(60_000);
    expect((await visitor.signIn('Ines Rautio')).status).toBe(200);
    expect((await visitor.signIn('Ines Rautio', 'a wrong one')).status).toBe(401);
  });

  test('cannot be sped up by asking all at once', async () => {
    const clock = new TestClock();
    const server = await startTestServer({ now: clock.now });
    const guesses = Array.from({ length: 20 }, () => new Visitor(server).signIn('No Such Person', 'a wrong one'));
    const statuses = (await Promise.all(guesses)).map(({ status }) => status);
    expect(statuses.filter((status) => status === 401)).toHaveLength(5);
    expect(statuses.filter((status) => status === 429)).toHaveLength(15);
  });

  test('is remembered over a restart', async () => {
    const clock = new TestClock();
    const file = newDatabaseFile();
    const first = await startTestServer({ now: clock.now, file });
    for (let i = 0; i < 5; i += 1) await new Visitor(first).signIn('Ines Rautio', 'a wrong one');
    await first.stop();
    const second = await startTestServer({ now: clock.now, file });
    expect((await new Visitor(second).signIn('Ines Rautio')).status).toBe(429);
  });
});
