import { defineConfig } from '@playwright/test';
import { launchOptions } from './chromium.mjs';

export default defineConfig({
  testDir: '.',
  outputDir: '../test-results/browser',
  fullyParallel: true,
  workers: 2,
  // Generous: the same tests must hold on a machine that does other work besides.
  timeout: 240_000,
  expect: { timeout: 30_000 },
  forbidOnly: Boolean(process.env.CI),
  reporter: 'list',
  use: {
    baseURL: process.env.GAPWRIGHT_URL ?? '',
    browserName: 'chromium',
    viewport: { width: 1440, height: 900 },
    launchOptions: launchOptions(),
    actionTimeout: 60_000,
    screenshot: 'only-on-failure',
  },
  webServer: {
    command: 'node ../app/serve.mjs --no-build',
    wait: { stdout: /open (?<gapwright_url>http:\S+)/ },
  },
});
