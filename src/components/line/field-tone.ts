import type { LineTone } from "./line-context";

/** Class of the box for each tone; the words stand in globals.css. */
export const fieldBox: Record<LineTone, string> = {
  rest: "field-box",
  warn: "field-box warn",
  bad: "field-box bad",
  derived: "field-box derived",
  locked: "field-box locked",
};
