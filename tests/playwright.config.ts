import { defineConfig } from '@playwright/test'

/** Journeys through the built product in Debian's Chromium; call it from the top of the project. */
export default defineConfig({
  testDir: './e2e',
  testMatch: '**/*.test.ts',
  outputDir: '../test-results',
  globalSetup: './e2e/build.global.ts',
  // two cores: a second browser drawing maps in software would make both late
  workers: 1,
  retries: 0,
  timeout: 180_000,
  expect: { timeout: 15_000 },
  reporter: 'list',
  use: {
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
    actionTimeout: 20_000,
    locale: 'en-GB',
    launchOptions: {
      executablePath: '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--use-angle=swiftshader',
        '--enable-unsafe-swiftshader',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
  projects: [
    { name: 'desktop', use: { viewport: { width: 1280, height: 800 } } },
    {
      name: 'phone',
      // the same at every size: answers by role, the bundle, the outbox, the commands
      testIgnore: /(permission-matrix|bundle|mail-away|commands)/,
      use: { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true },
    },
  ],
})
