"use client";

import { useEffect, useId, useRef, useState, type ReactNode } from "react";

/**
 * The badge at the right end of the strip; opens what belongs to the person: sheet colour, account, sign-out.
 *
 * badge      "E-114"
 * role       "Engineer"; left out on phones
 * children   what the menu holds, as plain links, buttons and `<ThemeSwitch />`
 */
export function BadgeMenu({ badge, role, children }: { badge: string; role: string; children: ReactNode }) {
  const [open, setOpen] = useState(false);
  const box = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const panelId = useId();

  useEffect(() => {
    if (!open) return;
    const closeOutside = (event: Event) => {
      if (!box.current?.contains(event.target as Node)) setOpen(false);
    };
    const closeOnEscape = (event: KeyboardEvent) => {
      if (event.key !== "Escape") return;
      setOpen(false);
      button.current?.focus();
    };
    document.addEventListener("pointerdown", closeOutside);
    document.addEventListener("focusin", closeOutside);
    document.addEventListener("keydown", closeOnEscape);
    return () => {
      document.removeEventListener("pointerdown", closeOutside);
      document.removeEventListener("focusin", closeOutside);
      document.removeEventListener("keydown", closeOnEscape);
    };
  }, [open]);

  return (
    <div ref={box} className="relative">
      <button
        ref={button}
        type="button"
        aria-expanded={open}
        aria-controls={panelId}
        onClick={() => setOpen(!open)}
        className="flex min-h-[34px] items-center gap-1.5 text-small phone:min-h-[44px] phone:min-w-[44px] phone:justify-end"
      >
        <span className="phone:sr-only">{role}</span> {badge}
        <svg width="9" height="6" viewBox="0 0 9 6" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="1.4">
          <path d="M1 1l3.5 3.5L8 1" />
        </svg>
      </button>
      <div
        id={panelId}
        hidden={!open}
        className="absolute right-0 top-full z-40 mt-1 grid min-w-[220px] gap-3 whitespace-normal rounded bg-sheet p-4 shadow-over"
      >
        {children}
      </div>
    </div>
  );
}
