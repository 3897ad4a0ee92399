import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { defineConfig } from '@playwright/test';

/**
 * The browser tests run against the built server, on a port and in a folder of their own. This file is read once more by
 * every worker: the first reading chooses, and hands its choice on in the environment.
 */
const { env } = process;
/** E2E_URL runs the tests against a server that is running already, for working on them. */
const running = env.E2E_URL;
env.E2E_PORT ??= String(4400 + (process.pid % 500));
if (!running && !env.E2E_DATA) {
  const data = mkdtempSync(join(tmpdir(), 'retrodict-e2e-'));
  env.E2E_DATA = data;
  process.on('exit', () => rmSync(data, { recursive: true, force: true }));
}
const baseURL = running ?? `http://127.0.0.1:${env.E2E_PORT}`;

export default defineConfig({
  testDir: 'e2e',
  workers: 2,
  retries: 0,
  forbidOnly: env.CI !== undefined,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: 'list',
  use: {
    baseURL,
    viewport: { width: 1440, height: 900 },
    locale: 'en-GB',
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: env.CHROMIUM_PATH ?? '/usr/bin/chromium',
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
  webServer: running
    ? undefined
    : {
        command: 'node app/start.mjs',
        url: `${baseURL}/api/health`,
        env: { PORT: env.E2E_PORT, HOST: '127.0.0.1', DATA_DIR: env.E2E_DATA ?? '' },
        timeout: 240_000,
        reuseExistingServer: false,
        gracefulShutdown: { signal: 'SIGTERM', timeout: 5_000 },
      },
});
