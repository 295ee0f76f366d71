import { defineConfig } from '@playwright/test';

const PORT = 4290;
const BASE = `http://127.0.0.1:${PORT}`;

export default defineConfig({
  testDir: '.',
  outputDir: '../test-results',
  workers: 2,
  forbidOnly: true,
  // scenes are drawn without a graphics unit, on however busy a machine
  timeout: 180_000,
  expect: { timeout: 20_000 },
  reporter: 'list',
  use: {
    baseURL: BASE,
    locale: 'en-GB',
    viewport: { width: 1440, height: 900 },
    launchOptions: { executablePath: '/usr/bin/chromium' },
    trace: 'retain-on-failure',
  },
  webServer: {
    command: `node e2e/serve.mjs ${PORT}`,
    cwd: '..',
    url: `${BASE}/api/ready`,
    timeout: 120_000,
    reuseExistingServer: false,
    gracefulShutdown: { signal: 'SIGTERM', timeout: 8000 },
  },
});
