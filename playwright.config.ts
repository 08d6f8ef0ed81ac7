import { defineConfig } from '@playwright/test';

export default defineConfig({
  testDir: 'e2e/journeys',
  outputDir: 'test-results',
  globalSetup: './e2e/start-stack.ts',
  timeout: 120_000,
  expect: { timeout: 15_000 },
  workers: 2,
  forbidOnly: true,
  reporter: [
    ['list'],
    ...(process.env['KINVALE_COUNTS'] === undefined
      ? []
      : [['json', { outputFile: process.env['KINVALE_COUNTS'] }] as const]),
  ],
  use: {
    baseURL: process.env['KINVALE_URL'], // set by the global setup before a worker reads this file
    ignoreHTTPSErrors: true, // the certificate is made at the start of the run
    viewport: { width: 1440, height: 900 },
    locale: 'en-GB',
    timezoneId: 'UTC',
    actionTimeout: 20_000,
    contextOptions: { reducedMotion: 'reduce' },
    screenshot: 'only-on-failure',
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: '/usr/bin/chromium',
      args: ['--no-sandbox', '--disable-quic', '--disable-background-networking'],
    },
  },
});
