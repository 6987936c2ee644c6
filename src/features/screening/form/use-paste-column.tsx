"use client";

import { useContext, createContext, type ClipboardEventHandler } from "react";
import type { LineKey } from "@/contracts/lines/line";
import { pastedColumn } from "./paste";

/** Told of a pasted column: where it starts, and its cells. The part shows what would be filled before it counts. */
export const PasteContext = createContext<((from: LineKey, cells: string[]) => void) | null>(null);

export function usePasteColumn(lineKey: LineKey): ClipboardEventHandler<HTMLInputElement> {
  const offer = useContext(PasteContext);
  return (event) => {
    const cells = pastedColumn(event.clipboardData.getData("text/plain"));
    if (!cells || !offer) return;
    event.preventDefault();
    offer(lineKey, cells);
  };
}
