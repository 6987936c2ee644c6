"use client";

import { useEffect, useRef, useState } from "react";
import { useShown } from "@/components/quantity/quantity";
import { verdictWords } from "@/components/verdict/verdict";
import { useForerunState } from "./forerun-context";
import { governingFigure } from "./governing";

const everyMs = 5000;

/** Verdict and governing figure for readers by ear: at most every 5 s, and only when they have changed. */
export function ForerunSaid() {
  const { result } = useForerunState();
  const shown = useShown();
  const governing = result && governingFigure(result, shown);
  const text = result && governing ? `Forerun: ${verdictWords[result.verdict]}, ${governing.figure} ${governing.words}.` : "";
  return (
    <p aria-live="polite" className="sr-only">
      {useSpaced(text)}
    </p>
  );
}

/** The newest text, given out no more often than every 5 s, so that typing is not talked over. */
function useSpaced(text: string): string {
  const [said, setSaid] = useState("");
  const last = useRef(0);
  useEffect(() => {
    const wait = Math.max(0, last.current + everyMs - Date.now());
    const timer = setTimeout(() => {
      last.current = Date.now();
      setSaid(text);
    }, wait);
    return () => clearTimeout(timer);
  }, [text]);
  return said;
}
