import { Trouble } from "./trouble.mjs";

export const testParts = ["static", "unit", "integration", "e2e"];

/**
 * Reads what follows `npm test --`.
 *
 * Returns  `{ parts, filters }`: the parts to run, in their fixed order (all when none is named), and words that the test runners
 *          match against file names
 */
export function parseTestArguments(args) {
  refuseOptions(args, "npm test -- [static] [unit] [integration] [e2e] [words of a file name]");
  const named = testParts.filter((part) => args.includes(part));
  return { parts: named.length > 0 ? named : testParts, filters: args.filter((word) => !testParts.includes(word)) };
}

/** Reads what follows `npm run up --`. */
export function parseUpArguments(args) {
  const rest = args.filter((word) => word !== "--dev");
  if (rest.length > 0)
    throw new Trouble(
      `"${rest[0]}" means nothing here. Use: npm run up, or npm run dev; the port is set by PORT=3001 npm run up`,
    );
  return { dev: args.includes("--dev") };
}

function refuseOptions(args, usage) {
  const option = args.find((word) => word.startsWith("-"));
  if (option) throw new Trouble(`"${option}" means nothing here. Use: ${usage}`);
}
