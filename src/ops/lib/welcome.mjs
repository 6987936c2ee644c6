import { relative } from "node:path";
import { root } from "./places.mjs";

/** @typedef {{ role: string, badge: string, printedName: string, password: string }} DemoAccount */

/**
 * What stands at the end of a start.
 *
 * accounts  the demo accounts as the seed printed them; none when the demo is not loaded
 * Returns   lines
 *
 * @param {{ port: number, accounts: DemoAccount[] | undefined, places: { mail: string, storage: string } }} given
 */
export function welcomeLines({ port, accounts, places }) {
  const lines = ["", `  Ebbmark is at http://localhost:${port}`, ""];
  if (accounts?.length) lines.push("  Demo accounts (invented people, for trying out only):", ...table(accounts), "");
  lines.push(
    `  Mail is written to   ${relative(root, places.mail)}/`,
    `  Files are kept in    ${relative(root, places.storage)}/`,
    "",
    "  Stop it with Ctrl-C.",
  );
  return lines;
}

/** @param {DemoAccount[]} accounts */
function table(accounts) {
  const rows = [
    ["Sign in as", "Password", "Role", "Name"],
    ...accounts.map(({ badge, password, role, printedName }) => [badge, password, role, printedName]),
  ];
  const widths = [0, 1, 2, 3].map((column) => Math.max(...rows.map((row) => row[column]?.length ?? 0)));
  return rows.map((row) => `    ${row.map((cell, column) => cell.padEnd(widths[column] ?? 0)).join("  ")}`.trimEnd());
}
