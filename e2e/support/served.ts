import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** The built product, served as people get it, on a port and a database of its own. */
export class Served {
  readonly #folder = mkdtempSync(join(tmpdir(), 'stillpoint-'));
  readonly #flags: readonly string[];
  readonly #port: number;
  #process: ChildProcess | undefined;

  private constructor(port: number, flags: readonly string[]) {
    this.#port = port;
    this.#flags = flags;
  }

  /** Starts a server; with `--demo` among the flags it has the demo team. */
  static async start(...flags: readonly string[]): Promise<Served> {
    const served = new Served(await freePort(), flags);
    await served.#launch();
    return served;
  }

  static readonly demoPassword = 'two hundred fathoms';

  get url(): string {
    return `http://localhost:${this.#port}`;
  }

  /** Stops the server as an operator would and starts it again on the same database. */
  async restart(): Promise<void> {
    await this.#halt();
    await this.#launch();
  }

  async stop(): Promise<void> {
    await this.#halt();
    rmSync(this.#folder, { recursive: true, force: true });
  }

  async #launch(): Promise<void> {
    const child = spawn(process.execPath, ['dist/server/index.js', ...this.#flags], {
      env: {
        ...process.env,
        PORT: String(this.#port),
        HOST: '127.0.0.1',
        DATABASE_FILE: join(this.#folder, 'test.db'),
        DEMO_PASSWORD: Served.demoPassword,
        LOG_LEVEL: 'warn',
      },
      stdio: ['ignore', 'pipe', 'inherit'],
    });
    this.#process = child;
    await new Promise<void>((resolve, reject) => {
      child.once('exit', (code) => reject(new Error(`the server ended with status ${code} before it was ready`)));
      child.stdout?.on('data', (text: Buffer) => {
        if (String(text).includes('Stillpoint is at')) resolve();
      });
    });
  }

  async #halt(): Promise<void> {
    const child = this.#process;
    if (!child || child.exitCode !== null) return;
    const ended = new Promise((resolve) => child.once('exit', resolve));
    child.kill('SIGTERM');
    await ended;
  }
}

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() =>
        address && typeof address === 'object' ? resolve(address.port) : reject(new Error('no port')),
      );
    });
  });
}
