import path from "node:path";
import { defineConfig } from "vitest/config";

const root = path.resolve(__dirname, "..");

/** Pure parts: no database, no other process. They run in the quick check. */
const UNIT = ["lib/{vocabulary,units,aero,evaluation}", "policies", "templates"].map(
  (folder) => `tests/${folder}/**/*.test.{ts,tsx}`,
);

export default defineConfig({
  root,
  resolve: {
    alias: {
      "@": root,
      // The guard against client bundles has no meaning in a test process.
      "server-only": path.join(root, "tests/support/server-only.ts"),
    },
  },
  test: {
    pool: "forks",
    maxWorkers: 2,
    testTimeout: 30_000,
    hookTimeout: 60_000,
    projects: [
      { extends: true, test: { name: "unit", include: UNIT } },
      {
        extends: true,
        test: {
          name: "integration",
          include: ["tests/**/*.test.{ts,tsx}"],
          exclude: [...UNIT, "tests/e2e/**", "node_modules/**"],
        },
      },
    ],
  },
});
