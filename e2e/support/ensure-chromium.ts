import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { findChromium } from './find-chromium';

/** Sees to it that there is a browser to test with, and says which: Debian's package as root, Playwright's own elsewhere. */
export function ensureChromium(): void {
  const found = findChromium();
  if (found) {
    say(`Browser tests use ${found}.`);
    return;
  }
  if (process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    say('No Chromium here: installing the Debian package (apt-get install chromium).');
    run('apt-get', ['update', '-q']);
    run('apt-get', ['install', '-y', '-q', 'chromium']);
    if (findChromium()) return;
  }
  say('No Chromium here: installing the one that Playwright brings (npx playwright install chromium).');
  run('npx', ['playwright', 'install', 'chromium']);
}

function run(command: string, args: readonly string[]): void {
  const { status } = spawnSync(command, args, { stdio: ['ignore', 'ignore', 'inherit'] });
  if (status !== 0)
    throw new Error(`${command} ${args.join(' ')} failed: install Chromium by hand, then run the tests again.`);
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}
