import { defineConfig } from "vitest/config";

// Three groups: `unit` needs nothing, `dom` draws components in jsdom, `integration` needs the throw-away cluster
// whose addresses the test command puts into the environment.
export default defineConfig({
  resolve: { tsconfigPaths: true, conditions: ["react-server"] },
  ssr: { resolve: { conditions: ["react-server", "node", "import", "default"] } },
  oxc: { jsx: { runtime: "automatic" } },
  test: {
    passWithNoTests: false,
    projects: [
      {
        extends: true,
        test: {
          name: "unit",
          environment: "node",
          include: ["src/**/*.test.ts", "db/**/*.test.ts", "tests/*.test.ts", "tests/golden/**/*.test.ts"],
          testTimeout: 30_000,
        },
      },
      {
        extends: true,
        resolve: { conditions: ["browser", "module", "import", "default"] },
        test: {
          name: "dom",
          environment: "jsdom",
          include: ["src/**/*.test.tsx"],
          setupFiles: ["tests/setup-dom.ts"],
          testTimeout: 20_000,
        },
      },
      {
        extends: true,
        test: {
          name: "integration",
          environment: "node",
          include: ["tests/integration/**/*.test.ts"],
          testTimeout: 60_000,
          hookTimeout: 60_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
