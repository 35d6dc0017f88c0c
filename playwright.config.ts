import { defineConfig } from '@playwright/test'

/** Debian's Chromium; CHROMIUM_PATH names another. Its sandbox does not start as root, and software rendering needs no GPU. */
const executablePath = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium'
const args = ['--no-sandbox', '--disable-gpu', '--use-gl=angle', '--use-angle=swiftshader', '--disable-background-networking', '--disable-component-update', '--disable-sync']

export default defineConfig({
  testDir: 'tests/browser',
  globalSetup: './tests/browser/support/global-setup.ts',
  outputDir: 'test-results',
  workers: 2,
  retries: 0,
  forbidOnly: true,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  reporter: [['list'], ['json', { outputFile: process.env.PLAYWRIGHT_JSON_OUTPUT_FILE ?? 'test-results/report.json' }]],
  use: {
    browserName: 'chromium',
    launchOptions: { executablePath, args },
    viewport: { width: 1440, height: 900 },
    locale: 'en-GB',
    timezoneId: 'UTC',
    actionTimeout: 15_000,
    screenshot: 'only-on-failure',
  },
})
