import base from '../../playwright.config';

export default {
  ...base,
  testDir: '.',
  outputDir: '../../test-results/bench',
  testMatch: '*.bench.ts',
  timeout: 600_000,
  retries: 0,
  reporter: 'list',
};
