import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { z } from 'zod';
import { ensureChromium } from '../../e2e/support/ensure-chromium';

/** `npm test`: types, lint, every vitest and browser test; ends with one line that counts them all. */

const RESULTS = 'test-results';
const vitestReport = z.object({ numPassedTests: z.number(), numFailedTests: z.number(), numPendingTests: z.number() });
const browserReport = z.object({
  stats: z.object({ expected: z.number(), unexpected: z.number(), flaky: z.number(), skipped: z.number() }),
});

type Count = { passed: number; failed: number; skipped: number };

function run(title: string, command: string, args: readonly string[]): boolean {
  process.stdout.write(`\n── ${title}\n`);
  const started = performance.now();
  const { status } = spawnSync(command, args, { stdio: 'inherit' });
  const seconds = ((performance.now() - started) / 1000).toFixed(1);
  process.stdout.write(`${title}: ${status === 0 ? 'passed' : `failed (status ${status})`} in ${seconds} s\n`);
  return status === 0;
}

/** A check that is not a test runner counts as one test. */
function check(title: string, command: string, args: readonly string[]): Count {
  const passed = run(title, command, args);
  return { passed: passed ? 1 : 0, failed: passed ? 0 : 1, skipped: 0 };
}

/** Counts of a runner's report; a runner that failed without naming a failed test, or wrote no report, counts as one failure. */
function counted(ok: boolean, file: string, read: (report: unknown) => Count): Count {
  if (!existsSync(file)) return { passed: 0, failed: 1, skipped: 0 };
  const count = read(JSON.parse(readFileSync(file, 'utf8')));
  return { ...count, failed: ok ? count.failed : Math.max(1, count.failed) };
}

function main(): void {
  rmSync(RESULTS, { recursive: true, force: true });
  mkdirSync(RESULTS);
  const counts: Count[] = [
    check('Types', 'npx', ['tsc', '--noEmit']),
    check('Lint', 'npx', ['biome', 'check', '.']),
    check('Build', 'npm', ['run', '--silent', 'build']),
  ];
  const vitestFile = `${RESULTS}/vitest.json`;
  const vitest = run('Unit, reference and server tests', 'npx', [
    'vitest',
    'run',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${vitestFile}`,
  ]);
  counts.push(
    counted(vitest, vitestFile, (report) => {
      const { numPassedTests, numFailedTests, numPendingTests } = vitestReport.parse(report);
      return { passed: numPassedTests, failed: numFailedTests, skipped: numPendingTests };
    }),
  );
  ensureChromium();
  const browser = run('Browser tests', 'npx', ['playwright', 'test']);
  counts.push(
    counted(browser, `${RESULTS}/e2e.json`, (report) => {
      const { expected, unexpected, flaky, skipped } = browserReport.parse(report).stats;
      return { passed: expected, failed: unexpected + flaky, skipped };
    }),
  );
  const sum = (key: keyof Count) => counts.reduce((total, count) => total + count[key], 0);
  const skipped = sum('skipped');
  process.stdout.write(
    `\n${sum('passed')} passed, ${sum('failed')} failed${skipped > 0 ? `, ${skipped} skipped` : ''}\n`,
  );
  process.exitCode = sum('failed') === 0 ? 0 : 1;
}

main();
