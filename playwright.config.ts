import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { defineConfig, devices } from '@playwright/test';
import { findChromium } from './server/scripts/chromium';

// This file is read again in every worker process: what it chooses once is handed on in the environment.
process.env.LEEBOARD_PORT ??= String(20_000 + (process.pid % 20_000));
process.env.LEEBOARD_DATA_DIR ??= mkdtempSync(join(tmpdir(), 'leeboard-browser-'));
process.env.LEEBOARD_BOOTSTRAP_KEY ??= 'browser-tests-browser-tests';
const baseURL = `http://127.0.0.1:${process.env.LEEBOARD_PORT}`;

export default defineConfig({
  testDir: 'e2e',
  outputDir: 'test-results/browser',
  workers: 1,
  retries: 0,
  timeout: 90_000,
  expect: { timeout: 20_000 },
  reporter: [['list'], ['json', { outputFile: 'test-results/browser.json' }]],
  use: {
    ...devices['Desktop Chrome'],
    baseURL,
    viewport: { width: 1920, height: 1080 },
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: findChromium() ?? undefined,
      args: ['--no-sandbox', '--disable-gpu', '--use-angle=swiftshader', '--enable-unsafe-swiftshader', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--no-first-run'],
    },
  },
  webServer: {
    command: 'node --import tsx server/scripts/start.ts',
    url: `${baseURL}/api/v1/health`,
    timeout: 240_000,
    reuseExistingServer: false,
    gracefulShutdown: { signal: 'SIGTERM', timeout: 10_000 },
    stdout: 'ignore',
    stderr: 'pipe',
    env: { ...(process.env as Record<string, string>), LEEBOARD_MEMBERS: '100', LEEBOARD_LOG_LEVEL: 'warn', LEEBOARD_DEMO: 'on' },
  },
});
