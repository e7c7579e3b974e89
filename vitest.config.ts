import path from "node:path";
import { defineConfig } from "vitest/config";

// The zone of the machine must not matter; `npm test` runs the engine's tests under others as well.
process.env.TZ ??= "UTC";

export default defineConfig({
  resolve: {
    alias: {
      "@": import.meta.dirname,
      // Outside of Next this package only throws.
      "server-only": path.join(import.meta.dirname, "tests/setup/server-only.ts"),
    },
  },
  test: {
    include: ["tests/**/*.test.{ts,tsx}"],
    exclude: ["tests/e2e/**", "tests/bench/**"],
    globalSetup: ["tests/setup/global.ts"],
    setupFiles: ["tests/setup/settings.ts", "tests/setup/quiet-console.ts"],
    // A file and its database belong to one process: nothing leaks into the next.
    pool: "forks",
    maxWorkers: "100%",
    testTimeout: 30_000,
    hookTimeout: 60_000,
    // Zero files is decided by the runner (lib/run/test.mjs), which looks at the whole.
    passWithNoTests: false,
    restoreMocks: true,
    unstubEnvs: true,
    unstubGlobals: true,
  },
});
