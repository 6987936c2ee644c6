"use client";

import { useEffect, useRef, useState, type KeyboardEvent as ReactKeyboardEvent } from "react";

/** Keys typed here are words, not commands. */
const typesInto = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && (target.isContentEditable || target.matches("input, textarea, select"));

/**
 * Pressing `/` anywhere outside a field asks for a line number; Enter goes there. It works on the numbers everything else cites.
 *
 * onJump   goes to the line; false when there is none of that number, and then it says so
 */
export function LineJump({ onJump }: { onJump: (no: string) => boolean }) {
  const [open, setOpen] = useState(false);
  const [no, setNo] = useState("");
  const [unknown, setUnknown] = useState(false);
  const field = useRef<HTMLInputElement>(null);

  useEffect(() => {
    const ask = (event: KeyboardEvent) => {
      if (event.key !== "/" || event.ctrlKey || event.metaKey || event.altKey || typesInto(event.target)) return;
      event.preventDefault();
      setNo("");
      setUnknown(false);
      setOpen(true);
    };
    document.addEventListener("keydown", ask);
    return () => document.removeEventListener("keydown", ask);
  }, []);

  useEffect(() => {
    if (open) field.current?.focus();
  }, [open]);

  const decide = (event: ReactKeyboardEvent<HTMLInputElement>) => {
    if (event.key === "Escape") setOpen(false);
    if (event.key !== "Enter") return;
    event.preventDefault();
    if (onJump(no.trim().toUpperCase())) setOpen(false);
    else setUnknown(true);
  };

  if (!open) return null;
  return (
    <div role="search" className="fixed bottom-6 left-1/2 z-40 w-[280px] -translate-x-1/2 bg-sheet p-3 shadow-over">
      <label htmlFor="line-jump" className="block pb-1 text-label font-medium text-ink-3">
        Go to line
      </label>
      <div className={`field-box ${unknown ? "bad" : ""}`}>
        <input
          ref={field}
          id="line-jump"
          className="field-value words"
          inputMode="decimal"
          autoComplete="off"
          placeholder="4.03"
          value={no}
          aria-invalid={unknown || undefined}
          aria-describedby={unknown ? "line-jump-message" : undefined}
          onChange={(event) => {
            setNo(event.target.value);
            setUnknown(false);
          }}
          onKeyDown={decide}
          onBlur={() => setOpen(false)}
        />
      </div>
      {unknown && (
        <p id="line-jump-message" role="alert" className="pt-1 text-label text-beyond">
          There is no line {no}. Type part, dot, line.
        </p>
      )}
    </div>
  );
}
