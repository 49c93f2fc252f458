import { defineConfig } from "@playwright/test";

export default defineConfig({
  testDir: "e2e",
  testMatch: "**/*.spec.ts",
  outputDir: "../test-results/browser",
  globalSetup: "./e2e/support/global-setup.ts",
  // Each worker has an application and a database of its own; a file's tests build on each other's acts as people do.
  workers: 2,
  fullyParallel: false,
  retries: 0,
  timeout: 180_000,
  // Patient, because a busy machine is slow and a test that passes waits no longer than it must.
  expect: { timeout: 30_000 },
  use: {
    browserName: "chromium",
    viewport: { width: 1280, height: 900 },
    locale: "en-GB",
    trace: "off",
    screenshot: "only-on-failure",
    launchOptions: {
      executablePath: "/usr/bin/chromium",
      // The sandbox needs rights that a container's root does not have; the rest keeps Chromium off the network.
      args: [
        ...["--no-sandbox", "--disable-gpu", "--disable-background-networking"],
        ...["--disable-component-update", "--disable-sync"],
      ],
    },
  },
});
