import base from '../../playwright.config';

export default {
  ...base,
  testDir: '.',
  testMatch: '*.bench.ts',
  outputDir: '../../test-results/bench',
  timeout: 600_000,
  reporter: 'list',
  // A trace takes a copy of the page at every move of the pointer, and would be what is measured.
  use: { ...base.use, trace: 'off', screenshot: 'off' },
};
