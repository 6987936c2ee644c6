"use client";

/**
 * Which tabs of this browser are open. Each holds a lock of the browser while it lives; the browser drops it with the tab, however it ends.
 * Without such locks (an old browser, a page without https) every other tab counts as gone: its lines are then brought back and saved twice
 * with the same words, which changes nothing.
 */
const lockOf = (tab: string) => `ebbmark-tab/${tab}`;

/** Holds the tab's lock until `signal` ends it. */
export function keepAlive(tab: string, signal: AbortSignal): void {
  navigator.locks
    ?.request(lockOf(tab), { signal }, () => new Promise<void>((release) => signal.addEventListener("abort", () => release())))
    .catch(() => undefined);
}

export async function isAlive(tab: string): Promise<boolean> {
  if (!navigator.locks) return false;
  // Shared, so that two who ask at the same moment do not take each other for the tab.
  return navigator.locks.request(lockOf(tab), { mode: "shared", ifAvailable: true }, (lock) => lock === null);
}

export const newTab = (): string => Array.from(crypto.getRandomValues(new Uint32Array(2)), (part) => part.toString(36)).join("");
