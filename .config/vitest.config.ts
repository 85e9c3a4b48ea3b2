import { defineConfig } from "vitest/config";

export default defineConfig({
  test: {
    root: new URL("..", import.meta.url).pathname,
    include: ["test/**/*.test.ts", "test/**/*.test.tsx"],
    globalSetup: "test/browser/support/browser.ts",
    testTimeout: 60_000,
    hookTimeout: 180_000,
    // Browser and desk suites are heavy: two at a time fit a two-core laptop.
    maxWorkers: 2,
  },
});
