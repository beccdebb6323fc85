import { defineConfig } from '@playwright/test';
import { findChromium } from '@/lib/cli/chromium';
import { applyTestEnvironment } from '@/lib/cli/test-environment.mjs';

applyTestEnvironment();

const QUIET_CHROMIUM = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--disable-dev-shm-usage',
];

export default defineConfig({
  testDir: '../e2e',
  outputDir: '../../.artifacts/e2e',
  tsconfig: '../../lib/cli/tsconfig.json',
  globalSetup: '../support/e2e-up.ts',
  forbidOnly: true,
  fullyParallel: false,
  workers: 2,
  retries: 0,
  timeout: process.env.LONG === '1' ? 3_600_000 : 90_000,
  expect: { timeout: 10_000 },
  reporter: 'list',
  // What is measured against a clock has the machine to itself, after everything else. The estimates beside the main
  // thread take minutes of it, so they are looked at in the long form.
  projects: [
    { name: 'journeys', testIgnore: /large-comb|main-thread/ },
    {
      name: 'alone',
      testMatch: process.env.LONG === '1' ? /large-comb|main-thread/ : /large-comb/,
      dependencies: ['journeys'],
    },
  ],
  use: {
    baseURL: `http://127.0.0.1:${process.env.PORT}`,
    viewport: { width: 390, height: 844 },
    hasTouch: true,
    locale: 'en-US',
    timezoneId: 'America/New_York',
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
    launchOptions: { executablePath: findChromium(), args: QUIET_CHROMIUM },
  },
});
