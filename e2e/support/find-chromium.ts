import { existsSync } from 'node:fs';

const DEBIAN_CHROMIUM = '/usr/bin/chromium';

/** Path of Debian's Chromium, or undefined where Playwright's own browser is to be used. */
export function findChromium(): string | undefined {
  return existsSync(DEBIAN_CHROMIUM) ? DEBIAN_CHROMIUM : undefined;
}
