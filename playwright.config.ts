import { defineConfig } from '@playwright/test';

/** Where the product of this run listens; the global setup starts it. */
const baseURL = process.env.E2E_URL ?? 'http://127.0.0.1:8181';

export default defineConfig({
  testDir: 'tests/e2e',
  globalSetup: './tests/support/e2e-setup.ts',
  outputDir: 'test-results',
  // One house, one clock: the tests share a database and take their turns.
  workers: 1,
  fullyParallel: false,
  timeout: 120_000,
  expect: { timeout: 10_000 },
  reporter: process.env.E2E_REPORT ? [['json', { outputFile: process.env.E2E_REPORT }], ['line']] : [['line']],
  use: {
    baseURL,
    locale: 'en-GB',
    timezoneId: 'Europe/London',
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath: '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
});
