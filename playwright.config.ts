import { defineConfig } from '@playwright/test';

const port = Number(process.env.E2E_PORT ?? 4390);

// Debian's Chromium in place of a downloaded one; the flags keep it from calling home.
const chromium = {
  executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
  args: [
    '--no-sandbox',
    '--disable-gpu',
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
  ],
};

export default defineConfig({
  testDir: 'tests/e2e',
  timeout: 120_000,
  workers: 1,
  forbidOnly: true,
  retries: 0,
  // Shared machines are slow at times; a page that never answers fails all the same.
  expect: { timeout: 20_000 },
  reporter: [['list']],
  use: { baseURL: `http://127.0.0.1:${port}`, launchOptions: chromium, trace: 'retain-on-failure' },
  projects: [
    { name: 'phone', use: { viewport: { width: 360, height: 740 }, hasTouch: true } },
    { name: 'desk', use: { viewport: { width: 1280, height: 860 } } },
  ],
  webServer: {
    // A folder of its own each run: the journeys publish and sign up.
    command: `node tests/support/serve-fresh.mjs`,
    env: { PORT: String(port), LOG_LEVEL: 'error' },
    url: `http://127.0.0.1:${port}/readyz`,
    reuseExistingServer: false,
    timeout: 60_000,
  },
});
