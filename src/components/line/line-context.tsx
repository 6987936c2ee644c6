"use client";

import { createContext, useContext } from "react";

/** How a line stands; the field inside draws itself by it. */
export type LineTone = "rest" | "warn" | "bad" | "derived" | "locked";

export type LineIds = {
  valueId: string;
  labelId: string;
  label: string;
  /** Ids of hint and message, for `aria-describedby`. */
  describedBy: string | undefined;
  tone: LineTone;
};

export const LineContext = createContext<LineIds | null>(null);

/** What the line around a field says about it; null for a field that stands alone. */
export const useLine = (): LineIds | null => useContext(LineContext);
