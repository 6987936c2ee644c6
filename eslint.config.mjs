import next from "eslint-config-next/core-web-vitals";
import typescript from "eslint-config-next/typescript";

/** Import directions: what each layer must never reach. `tests/architecture.test.ts` reads the same table from the imports. */
const never = (files, groups, reason) => ({
  files,
  rules: {
    "no-restricted-imports": [
      "error",
      {
        // Bare names of Node's modules are names, not patterns: a pattern "path" would also catch our own folder of that name.
        paths: groups.includes(node) ? ["fs", "path", "crypto", "worker_threads"].map((name) => ({ name, message: reason })) : [],
        patterns: groups.map((group) => ({ group, message: reason })),
      },
    ],
  },
});

const node = ["node:*"];
const web = ["react", "react-dom", "react/*", "next", "next/*", "formik", "chart.js", "react-chartjs-2"];
const database = ["pg", "pg-boss", "drizzle-orm", "drizzle-orm/*", "@db/*", "**/db/**"];

const config = [
  { ignores: [".next/**", ".ebbmark/**", "coverage/**", "next-env.d.ts", "test-results/**", "playwright-report/**"] },
  ...next,
  ...typescript,
  {
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "no-restricted-syntax": [
        "error",
        { selector: "JSXAttribute[name.name='style']", message: "No style attributes: the content policy forbids them." },
        { selector: "Directive[value='use server']", message: "Changes go through route handlers, not server actions." },
      ],
      eqeqeq: ["error", "always", { null: "ignore" }],
    },
  },
  never(
    ["src/engine/**"],
    [node, web, database, ["zod", "yup", "@/contracts/*", "@/server/*", "@/features/*", "@/components/*", "@/ledger/*"]],
    "The engine imports only itself and odex.",
  ),
  never(
    ["src/ledger/**"],
    [node, web, database, ["@/contracts/*", "@/server/*", "@/features/*", "@/components/*", "@/engine/*"]],
    "The ledger library imports only itself.",
  ),
  never(
    ["src/contracts/**"],
    [node, web, database, ["@/server/*", "@/features/*", "@/components/*"]],
    "Contracts run on both sides of the wire.",
  ),
  never(
    ["src/components/**"],
    [node, database, ["@/features/*", "@/server/*"]],
    "Shared components know no feature and no server.",
  ),
  never(
    ["src/features/**", "src/workers/browser.ts"],
    [node, database, ["@/server/*"]],
    "Client code never imports server code.",
  ),
  never(["src/app/**"], [["pg", "drizzle-orm", "drizzle-orm/*", "@db/*"]], "Routes read and write through src/server."),
  {
    files: ["src/engine/**/*.test.ts", "src/ledger/**/*.test.ts", "src/contracts/**/*.test.ts"],
    rules: { "no-restricted-imports": "off" },
  },
];

export default config;
