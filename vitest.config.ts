import { defineConfig } from "vitest/config";

// Three groups: `unit` needs nothing, `dom` draws components in jsdom, `integration` needs the throw-away cluster
// whose addresses the test command puts into the environment.
// `server-only` opens for the react-server condition alone; React's own client library closes for it, so `dom` goes without.
const onTheServer = {
  resolve: { conditions: ["react-server"] },
  ssr: { resolve: { conditions: ["react-server", "node", "default"] } },
};

export default defineConfig({
  resolve: { tsconfigPaths: true },
  oxc: { jsx: { runtime: "automatic" } },
  test: {
    passWithNoTests: false,
    projects: [
      {
        extends: true,
        ...onTheServer,
        test: {
          name: "unit",
          environment: "node",
          include: ["src/**/*.test.ts", "db/**/*.test.ts", "tests/*.test.ts", "tests/golden/**/*.test.ts"],
          testTimeout: 30_000,
        },
      },
      {
        extends: true,
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
        ...onTheServer,
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
