import { describe, expect, test } from 'vitest';
import { readConfig } from '../../server/config';

describe('the settings', () => {
  test('may all be left out', () => {
    expect(readConfig('demo', {})).toEqual({
      mode: 'demo',
      port: 4600,
      host: '127.0.0.1',
      databaseFile: 'data/demo.db',
      publicUrl: undefined,
      trustProxy: 0,
      demoPassword: undefined,
      logLevel: 'warn',
    });
    expect(readConfig('serve', { PORT: '' })).toMatchObject({ host: undefined, databaseFile: 'data/stillpoint.db' });
  });

  test('that are wrong are all named at once', () => {
    const env = {
      PORT: 'http',
      PUBLIC_URL: 'https://stillpoint.example/app',
      TRUST_PROXY: '-1',
      DEMO_PASSWORD: 'short',
    };
    for (const name of Object.keys(env)) expect(() => readConfig('serve', env)).toThrow(name);
  });

  test('never put the demo on the network', () => {
    expect(() => readConfig('demo', { HOST: '0.0.0.0' })).toThrow(/loopback/);
    expect(() => readConfig('dev', { HOST: '192.0.2.4' })).toThrow(/loopback/);
    expect(readConfig('demo', { HOST: '::1' }).host).toBe('::1');
  });
});
