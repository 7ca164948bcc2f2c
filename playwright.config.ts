import { defineConfig, devices } from '@playwright/test'

const asRoot = process.getuid?.() === 0
const chrome = 'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/150.0.0.0 Safari/537.36'

export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: '.local/e2e',
  fullyParallel: false,
  workers: 1,
  retries: 0,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  use: {
    baseURL: process.env.TEST_BASE_URL,
    // A server takes "Headless" for a crawler and then does not stream.
    userAgent: chrome,
    locale: 'en-GB',
    timezoneId: 'Pacific/Auckland',
    screenshot: 'only-on-failure',
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: '/usr/bin/chromium',
      args: [
        ...(asRoot ? ['--no-sandbox'] : []),
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-quic',
        '--no-first-run',
      ],
    },
  },
  projects: [
    {
      name: 'desktop',
      testMatch: '**/*.test.ts',
      testIgnore: '**/*.phone.test.ts',
      use: { viewport: { width: 1440, height: 900 } },
    },
    {
      name: 'phone',
      testMatch: '**/*.phone.test.ts',
      use: {
        ...devices['Pixel 7'],
        userAgent: chrome.replace('X11; Linux x86_64', 'Linux; Android 14; Pixel 7'),
        viewport: { width: 390, height: 844 },
      },
    },
  ],
})
