import { defineConfig } from '@playwright/test';
import base from '../playwright.config';

/** `npm run shots`: pictures of the pages, for looking at. */
export default defineConfig({
  ...base,
  testDir: '.',
  testMatch: '*.shots.ts',
  outputDir: '../test-results/shots',
  reporter: 'list',
});
