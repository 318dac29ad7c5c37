import { defineConfig } from "@playwright/test";

/** `npm test` names the Chromium it found in CHROMIUM_PATH. */
export default defineConfig({
  testDir: "tests/browser",
  outputDir: "test-results",
  fullyParallel: true,
  workers: 2,
  // A machine under load is slow, not wrong.
  timeout: 300_000,
  expect: { timeout: 60_000 },
  forbidOnly: true,
  reporter: process.env.PLAYWRIGHT_JSON_OUTPUT_FILE ? [["line"], ["json"]] : [["list"]],
  use: {
    viewport: { width: 360, height: 780 },
    locale: "en-GB",
    timezoneId: "Europe/Berlin",
    launchOptions: {
      executablePath: process.env.CHROMIUM_PATH ?? "/usr/bin/chromium",
      args: [
        "--no-sandbox",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
      ],
    },
  },
});
