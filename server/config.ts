import { z } from 'zod';

/** What is served: the demo team on loopback, a real team, or the demo with hot reload. */
export type Mode = 'demo' | 'serve' | 'dev';

export interface Config {
  readonly mode: Mode;
  readonly port: number;
  /** Undefined: every interface. */
  readonly host: string | undefined;
  readonly databaseFile: string;
  /** The address people type, without a path; undefined: http://localhost at the port. */
  readonly publicUrl: string | undefined;
  /** How many proxies before the server tell the sender's address. */
  readonly trustProxy: number;
  /** Undefined: a random one is made and kept. */
  readonly demoPassword: string | undefined;
  readonly logLevel: 'fatal' | 'error' | 'warn' | 'info' | 'debug' | 'silent';
}

const LOOPBACK = ['localhost', '127.0.0.1', '::1'];

const environment = z.object({
  PORT: z.coerce.number('must be a port number').int().min(0).max(65_535).default(4600),
  HOST: z.string().optional(),
  DATABASE_FILE: z.string().optional(),
  PUBLIC_URL: z
    .url({ protocol: /^https?$/, error: 'must be an http or https address' })
    .refine((text) => new URL(text).pathname === '/' && !/[?#]/.test(text), 'must have no path')
    .transform((text) => new URL(text).origin)
    .optional(),
  TRUST_PROXY: z.coerce.number('must be a number of proxies').int().min(0).max(10).default(0),
  DEMO_PASSWORD: z.string().min(8, 'must have at least 8 characters').max(256).optional(),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).optional(),
});

/** Reads the settings once. Throws an error whose message names every variable that is wrong. */
export function readConfig(mode: Mode, env: Readonly<Record<string, string | undefined>>): Config {
  // An empty variable is one left out: `PORT= npm start`.
  const given = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== undefined && value !== ''));
  const read = environment.safeParse(given);
  if (!read.success) {
    const faults = read.error.issues.map((issue) => `  ${issue.path.join('.')} ${issue.message}`);
    throw new Error(`The settings are wrong (.env.example lists them):\n${faults.join('\n')}`);
  }
  const { PORT, HOST, DATABASE_FILE, PUBLIC_URL, TRUST_PROXY, DEMO_PASSWORD, LOG_LEVEL } = read.data;
  const demo = mode !== 'serve';
  if (demo && HOST !== undefined && !LOOPBACK.includes(HOST)) {
    throw new Error(`The demo has known sign-ins, so it is served on loopback only: HOST cannot be ${HOST}.`);
  }
  return {
    mode,
    port: PORT,
    host: HOST ?? (demo ? '127.0.0.1' : undefined),
    databaseFile: DATABASE_FILE ?? (demo ? 'data/demo.db' : 'data/stillpoint.db'),
    publicUrl: PUBLIC_URL,
    trustProxy: TRUST_PROXY,
    demoPassword: DEMO_PASSWORD,
    logLevel: LOG_LEVEL ?? (demo ? 'warn' : 'info'),
  };
}
