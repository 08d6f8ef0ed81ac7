import { defineConfig } from '@playwright/test';
import journeys from '../../playwright.config';

const minuteMs = 60_000;

/** As the journeys run, alone and with patience: a slow machine breaks no promise. */
export default defineConfig(journeys, {
  testDir: '.',
  testMatch: 'large-import.ts',
  outputDir: '../../test-results',
  globalSetup: '../../e2e/start-stack.ts',
  timeout: 15 * minuteMs,
  expect: { timeout: 2 * minuteMs },
  workers: 1,
  reporter: 'list',
  use: { actionTimeout: 2 * minuteMs, trace: 'off' },
});
