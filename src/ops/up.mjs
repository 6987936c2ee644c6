import { checkNode } from "./lib/check-node.mjs";

/** `npm run up` and `npm run dev`: everything from nothing to the running product. */
checkNode();
void import("./lib/up-command.mjs").then(({ up }) => up(process.argv.slice(2)));
