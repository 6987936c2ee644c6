"use client";

import { createContext, useContext, type ReactNode } from "react";
import { useDraft } from "../form/draft-context";
import { useForerun, type ForerunState } from "./use-forerun";

const ForerunContext = createContext<ForerunState | null>(null);

/** Runs the draft for all parts of the form at once: going from part to part starts nothing again and keeps the ghost. */
export function ForerunProvider({ children }: { children: ReactNode }) {
  const { made, letter } = useDraft();
  return <ForerunContext.Provider value={useForerun(made.document, letter)}>{children}</ForerunContext.Provider>;
}

export function useForerunState(): ForerunState {
  const state = useContext(ForerunContext);
  if (!state) throw new Error("the forerun is shown outside its provider");
  return state;
}
