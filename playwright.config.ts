import { defineConfig } from "@playwright/test";

/** Browser tests against the server that the test command started at BASE_URL. One worker: the journeys share a database. */
export default defineConfig({
  testDir: "tests/e2e",
  outputDir: ".ebbmark/test-results",
  workers: 1,
  fullyParallel: false,
  forbidOnly: true,
  retries: 0,
  timeout: 240_000, // far above what a journey takes, for a machine that is busy with other work
  expect: { timeout: 15_000 },
  reporter: [["list"], ["json", { outputFile: process.env.PLAYWRIGHT_JSON_OUTPUT_NAME ?? ".ebbmark/test-reports/e2e.json" }]],
  use: {
    baseURL: process.env.BASE_URL ?? "http://localhost:3000",
    browserName: "chromium",
    viewport: { width: 1440, height: 900 },
    locale: "en-GB",
    timezoneId: "UTC",
    screenshot: "only-on-failure",
    trace: "retain-on-failure",
    launchOptions: {
      executablePath: process.env.CHROMIUM_PATH ?? "/usr/bin/chromium",
      args: [
        "--no-sandbox", // Debian's browser refuses its sandbox as root, and it meets our own pages only
        "--disable-gpu",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
      ],
    },
  },
});
