import { checkNode } from "./lib/check-node.mjs";

/** `npm test`: everything from nothing to one line that counts all tests. */
checkNode();
void import("./lib/test-command.mjs").then(({ test }) => test(process.argv.slice(2)));
