import { defineConfig } from "@playwright/test";
import { freePort } from "./db/server-ports.mjs";
import { CHROMIUM, CHROMIUM_FLAGS } from "./lib/run/chromium.mjs";

// Read by every worker too: the first to come chooses, the others inherit.
const port = (process.env.BELLWARD_E2E_PORT ??= String(await freePort()));
const url = `http://127.0.0.1:${port}`;

export default defineConfig({
  testDir: "tests/e2e",
  outputDir: "test-results",
  // Seconds on a quiet machine; room for a busy one.
  timeout: 90_000,
  expect: { timeout: 15_000 },
  forbidOnly: true,
  retries: 0,
  workers: 2,
  reporter: [["list"]],
  use: {
    baseURL: url,
    browserName: "chromium",
    viewport: { width: 1440, height: 900 },
    locale: "en-GB",
    timezoneId: "Europe/London",
    // A trace of every test costs more than the tests: `npx playwright test --trace on` where one is needed.
    screenshot: "only-on-failure",
    launchOptions: {
      executablePath: CHROMIUM,
      args: CHROMIUM_FLAGS,
    },
  },
  webServer: {
    command: "exec node --import tsx tests/setup/e2e-server.ts",
    url: `${url}/api/health`,
    // Builds first when the sources changed.
    timeout: 300_000,
    gracefulShutdown: { signal: "SIGTERM", timeout: 20_000 },
    stderr: "pipe",
  },
});
