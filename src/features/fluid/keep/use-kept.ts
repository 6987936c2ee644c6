"use client";

import { useCallback, useEffect, useRef, useState } from "react";

const restMs = 300;

type Codec<T> = { encode: (value: T) => string; decode: (text: string) => T | null };

/**
 * What is typed on a page, kept in the fragment of its address, which never leaves the browser, and where asked for in the browser's store:
 * a reload, a bookmark or a copied address brings it back.
 *
 * codec    to and from the text of the fragment; what can't be read is as if nothing stood there. Defined outside the component
 * initial  where neither address nor store holds anything
 * store    key in the browser's store, for pages that open without an address of their own
 * Returns  the value, null until the browser has been asked, and what sets it
 */
export function useKept<T>(codec: Codec<T>, initial: () => T, store?: string): [T | null, (value: T) => void] {
  const [value, setValue] = useState<T | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const unwritten = useRef<string | null>(null);
  const first = useRef(initial);

  useEffect(() => {
    const fromAddress = () => codec.decode(window.location.hash.slice(1));
    // Address and store are the browser's own: they are read after the first drawing, which the server made.
    setValue(fromAddress() ?? codec.decode(read(store) ?? "") ?? first.current());
    const follow = () => {
      const found = fromAddress();
      if (found !== null) setValue(found);
    };
    window.addEventListener("hashchange", follow);
    return () => window.removeEventListener("hashchange", follow);
  }, [codec, store]);

  useEffect(() => {
    const flush = () => {
      clearTimeout(timer.current);
      if (unwritten.current === null) return;
      write(unwritten.current, store);
      unwritten.current = null;
    };
    window.addEventListener("pagehide", flush);
    return () => {
      window.removeEventListener("pagehide", flush);
      // The page is left for another one: its address is no longer ours to write.
      clearTimeout(timer.current);
      if (unwritten.current !== null) keep(unwritten.current, store);
    };
  }, [store]);

  const set = useCallback(
    (next: T) => {
      setValue(next);
      unwritten.current = codec.encode(next);
      clearTimeout(timer.current);
      timer.current = setTimeout(() => {
        if (unwritten.current !== null) write(unwritten.current, store);
        unwritten.current = null;
      }, restMs);
    },
    [codec, store],
  );
  return [value, set];
}

function write(text: string, store: string | undefined): void {
  window.history.replaceState(null, "", `#${text}`);
  keep(text, store);
}

function keep(text: string, store: string | undefined): void {
  if (!store) return;
  try {
    localStorage.setItem(store, text);
  } catch {
    // Without room in the store the address still holds it.
  }
}

function read(store: string | undefined): string | null {
  try {
    return store ? localStorage.getItem(store) : null;
  } catch {
    return null;
  }
}
