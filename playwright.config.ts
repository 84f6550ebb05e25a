import { defineConfig } from '@playwright/test';

/**
 * Browser tests on the built client (dist/), once as a phone and once as a desktop. Each has a register of
 * its own, made anew at the start, so that both can go from sign-in to the citation of version 2.
 */

const firstPort = Number(process.env['BROWSER_TEST_PORT'] ?? '4790');
const sizes = [
  { name: 'phone', port: firstPort, viewport: { width: 390, height: 844 }, touch: true },
  { name: 'desktop', port: firstPort + 1, viewport: { width: 1440, height: 900 }, touch: false },
];

export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'test-results',
  snapshotPathTemplate: '{testDir}/snapshots/{projectName}/{arg}{ext}',
  timeout: 90_000,
  expect: { timeout: 20_000 },
  forbidOnly: process.env['CI'] !== undefined,
  // A test that passes at the second try has found something.
  retries: 0,
  workers: sizes.length,
  reporter: [['list']],
  use: {
    locale: 'en-GB',
    timezoneId: 'UTC',
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
      args: ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'],
    },
  },
  projects: sizes.map(({ name, port, viewport, touch }) => ({
    name,
    // Tests of one size share a register, so they go one after another.
    workers: 1,
    use: { baseURL: `http://127.0.0.1:${port}`, viewport, hasTouch: touch },
  })),
  webServer: sizes.map(({ name, port }) => ({
    name,
    // `exec`: the register is the runner's own child, and sees when the runner dies.
    command: `exec node scripts/serveForTests.mjs ${name} ${port}`,
    url: `http://127.0.0.1:${port}/api/v1/health`,
    timeout: 600_000,
    reuseExistingServer: false,
    gracefulShutdown: { signal: 'SIGTERM' as const, timeout: 30_000 },
  })),
});
