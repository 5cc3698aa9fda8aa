import { readFileSync, statSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { meAnswer } from '#shared/api/accounts';
import { type Config, readConfig } from '../../../server/config';
import { type Running, startServer } from '../../../server/start';
import { solvedList } from '../support/solved-list';
import { startTestServer, temporaryFile } from '../support/start-test-server';
import { Visitor } from '../support/visitor';

const config = (mode: 'demo' | 'serve', file: string, more: Record<string, string> = {}): Config =>
  readConfig(mode, { PORT: '0', HOST: '127.0.0.1', DATABASE_FILE: file, LOG_LEVEL: 'silent', ...more });

async function signInAs(server: Running, email: string, password: string) {
  const visitor = new Visitor(server);
  const { status } = await visitor.post('/api/sign-in', { email, password });
  return { visitor, status };
}

describe('the demo', () => {
  test('has a person of each role and a sheet of every sort, from settled to missed', async () => {
    const file = temporaryFile('demo.db');
    const server = await startServer(config('demo', file));
    const { password = '', people = [] } = server.demo ?? {};
    const roles: string[] = [];
    for (const { email } of people) {
      const { visitor, status } = await signInAs(server, email, password);
      expect(status).toBe(200);
      roles.push(meAnswer.parse((await visitor.get('/api/me')).body).teams[0]?.role ?? '');
    }
    expect(roles.sort()).toEqual(['designer', 'owner', 'reviewer', 'viewer']);

    const { visitor } = await signInAs(server, 'ines@buoy.example', password);
    const sheets = await solvedList(visitor, await visitor.teamId());
    const worst = sheets.map(({ name, standing }) => [
      name,
      standing?.status === 'solved' && `${standing.worst?.ref} ${standing.worst?.verdict} of ${standing.fets}`,
    ]);
    expect(Object.fromEntries(worst)).toEqual({
      'Hydrophone input pair': 'Q6 missed of 6',
      'Second stage, cascode': 'Q1 missed of 2',
      'Bias reference': expect.stringMatching(/met of 5$/),
      'First stage': 'Q1 met of 1',
      'Cable driver, 12 V': expect.stringMatching(/met of 4$/),
    });
    await server.stop();
  });

  test('keeps a random password that only the file’s owner can read', async () => {
    const file = temporaryFile('random.db');
    const first = await startServer(config('demo', file));
    const kept = `${file}.demo-password`;
    expect(statSync(kept).mode & 0o777).toBe(0o600);
    expect(readFileSync(kept, 'utf8').trim()).toBe(first.demo?.password);
    expect(first.demo?.password.length).toBeGreaterThanOrEqual(12);
    await first.stop();
    const second = await startServer(config('demo', file));
    expect(second.demo?.password).toBe(first.demo?.password);
    await second.stop();
  });

  test('takes the password that it is given, also later', async () => {
    const file = temporaryFile('given.db');
    await (await startServer(config('demo', file))).stop();
    const server = await startServer(config('demo', file, { DEMO_PASSWORD: 'anchor-chain-9' }));
    expect((await signInAs(server, 'ines@buoy.example', 'anchor-chain-9')).status).toBe(200);
    await server.stop();
  });

  test('is never served to a real team', async () => {
    const file = temporaryFile('mixed.db');
    await (await startServer(config('demo', file))).stop();
    await expect(startServer(config('serve', file))).rejects.toThrow(/holds the demo/);
  });

  test('is not put into a database that holds somebody', async () => {
    const file = temporaryFile('taken.db');
    const real = await startServer(config('serve', file));
    await new Visitor(real).signUp('Ines Rautio');
    await real.stop();
    const demo = await startServer(config('demo', file));
    expect(demo.demo).toBeUndefined();
    expect((await signInAs(demo, 'ines@buoy.example', 'anything-at-all')).status).toBe(401);
    await demo.stop();
  });

  test('does not exist for a real team', async () => {
    const server = await startTestServer();
    expect(server.demo).toBeUndefined();
    expect((await signInAs(server, 'ines@buoy.example', 'anything-at-all')).status).toBe(401);
  });
});
