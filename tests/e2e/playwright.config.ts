import { defineConfig } from '@playwright/test'

/** `npm run test:e2e` starts the built product on a small seed and names its address here. */
const baseURL = process.env.E2E_BASE_URL ?? 'http://127.0.0.1:8080'

export default defineConfig({
  testDir: '.',
  testMatch: '**/*.e2e.ts',
  outputDir: '../../test-results/e2e',
  forbidOnly: true,
  fullyParallel: false,
  workers: 2,
  retries: 0,
  // Long enough for a machine that does other work beside; nothing here waits for time to pass.
  timeout: 120_000,
  expect: { timeout: 40_000 },
  reporter: [['list'], ['json', { outputFile: process.env.E2E_REPORT ?? '../../test-results/e2e.json' }]],
  use: {
    baseURL,
    browserName: 'chromium',
    launchOptions: {
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
    },
    screenshot: 'only-on-failure',
    trace: 'off',
  },
})
