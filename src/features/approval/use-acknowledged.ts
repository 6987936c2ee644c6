"use client";

import { useCallback, useState } from "react";

/** Ids ticked so far, each by its own act. */
export function useAcknowledged() {
  const [acknowledged, setAcknowledged] = useState<ReadonlySet<string>>(new Set());
  const toggle = useCallback((id: string, on: boolean) => {
    setAcknowledged((before) => {
      const after = new Set(before);
      if (on) after.add(id);
      else after.delete(id);
      return after;
    });
  }, []);
  return { acknowledged, toggle };
}
