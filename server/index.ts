import { type Mode, readConfig } from './config';
import { startServer } from './start';

/** `--demo`: the demo team on loopback; `--dev`: the same with hot reload; neither: a real team. */
function modeOf(args: readonly string[]): Mode {
  if (args.includes('--dev')) return 'dev';
  return args.includes('--demo') ? 'demo' : 'serve';
}

async function main(): Promise<void> {
  // The database, its copies and the demo's password are for this account's eyes.
  process.umask(0o077);
  const config = readConfig(modeOf(process.argv.slice(2)), process.env);
  const running = await startServer(config);
  const lines = [`Stillpoint is at ${running.url}`];
  if (config.mode === 'serve' && config.publicUrl === undefined) {
    lines.push(
      'PUBLIC_URL is not set: only people on this machine can sign in. Set it to the address that others type.',
    );
  }
  if (running.demo) {
    lines.push(`Sign in as one of these, with the password ${running.demo.password}`);
    for (const { email, role } of running.demo.people) lines.push(`  ${email} (${role})`);
  }
  process.stdout.write(`${lines.join('\n')}\n`);

  let stopping = false;
  const stop = () => {
    if (stopping) return;
    stopping = true;
    running.stop().then(
      () => process.exit(0),
      (error: unknown) => fail(error),
    );
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
}

function fail(error: unknown): never {
  const message = error instanceof Error ? error.message : String(error);
  const hint = message.includes('EADDRINUSE') ? '\nAnother program has this port: set PORT to a free one.' : '';
  process.stderr.write(`${message}${hint}\n`);
  process.exit(1);
}

main().catch(fail);
