import { defineConfig } from '@playwright/test';
import { browser } from './support/browser.ts';

const report = process.env['REPORT_FILE'];

/** Run by `npm test` after the build; it hands over the browser in CHROMIUM and wants a REPORT_FILE. */
export default defineConfig({
  testDir: '.',
  testMatch: '**/*.spec.ts',
  outputDir: '../../.shots/e2e',
  forbidOnly: true,
  workers: 2,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: report ? [['list'], ['json', { outputFile: report }]] : 'list',
  use: {
    launchOptions: browser(),
    locale: 'en-US',
    timezoneId: 'America/Chicago',
    trace: 'off',
    screenshot: 'only-on-failure',
  },
});
