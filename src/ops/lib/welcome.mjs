import { relative } from "node:path";
import { root } from "./places.mjs";

/**
 * What stands at the end of a start.
 *
 * accounts  the demo accounts as the seed printed them, or undefined when the demo is not loaded
 * Returns   lines
 */
export function welcomeLines({ port, accounts, places }) {
  const lines = ["", `  Ebbmark is at http://localhost:${port}`, ""];
  if (accounts?.length) {
    lines.push("  Demo accounts (invented people, for trying out only):");
    const rows = accounts.map((account) => [
      account.role,
      account.email ?? account.login ?? account.badge,
      account.password,
      account.name ?? "",
    ]);
    const widths = [0, 1, 2].map((column) => Math.max(...rows.map((row) => String(row[column]).length)));
    for (const row of rows)
      lines.push(`    ${row.map((cell, column) => String(cell).padEnd(widths[column] ?? 0)).join("  ")}`.trimEnd());
    lines.push("");
  }
  lines.push(
    `  Mail is written to   ${relative(root, places.mail)}/`,
    `  Files are kept in    ${relative(root, places.storage)}/`,
    "",
    "  Stop it with Ctrl-C.",
  );
  return lines;
}
