import { defineConfig } from "@playwright/test";

const HALF_MINUTE_MS = 30_000;

export default defineConfig({
  testDir: "../e2e",
  testMatch: "*.spec.ts",
  outputDir: "../test-results",
  globalSetup: "../e2e/real-server.ts",
  // The people of the demo act on the same designs: one walk after the other.
  workers: 1,
  fullyParallel: false,
  forbidOnly: true,
  retries: 0,
  timeout: 4 * HALF_MINUTE_MS,
  expect: { timeout: HALF_MINUTE_MS / 2 },
  reporter:
    process.env["PLAYWRIGHT_JSON_OUTPUT_NAME"] === undefined ? "list" : [["list"], ["json"]],
  use: {
    // Set by the global setup before a worker reads this.
    baseURL: process.env["AMPERSIGN_E2E_URL"] ?? "http://127.0.0.1:3000",
    browserName: "chromium",
    viewport: { width: 1440, height: 900 },
    screenshot: "only-on-failure",
    trace: "retain-on-failure",
    launchOptions: {
      executablePath: process.env["AMPERSIGN_CHROMIUM"] ?? "/usr/bin/chromium",
      // The browser talks to this machine alone.
      args: [
        "--no-sandbox",
        "--disable-gpu",
        "--disable-dev-shm-usage",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
        "--disable-default-apps",
        "--no-pings",
        "--host-resolver-rules=MAP * ~NOTFOUND , EXCLUDE 127.0.0.1 , EXCLUDE localhost",
      ],
    },
  },
});
