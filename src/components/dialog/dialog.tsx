"use client";

import { useEffect, useId, useRef, type ReactNode } from "react";

/**
 * A question that must be answered before anything else. The browser's own modal dialog: it holds the focus, closes on Escape and gives
 * the focus back to where it came from.
 *
 * open      shown or not; the caller keeps it
 * onClose   asked for by Escape, by the close button, or by a press outside
 * title     names it
 * actions   buttons at its foot, the main one first
 */
export function Dialog({
  open,
  onClose,
  title,
  children,
  actions,
}: {
  open: boolean;
  onClose: () => void;
  title: ReactNode;
  children: ReactNode;
  actions?: ReactNode;
}) {
  const box = useRef<HTMLDialogElement>(null);
  const titleId = useId();

  useEffect(() => {
    const dialog = box.current;
    if (!dialog) return;
    if (open && !dialog.open) {
      const before = document.activeElement;
      dialog.showModal();
      return () => {
        if (dialog.open) dialog.close();
        if (before instanceof HTMLElement && before.isConnected) before.focus();
      };
    }
  }, [open]);

  return (
    <dialog
      ref={box}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        // The backdrop belongs to the dialog element itself; its content lies in the box inside.
        if (event.target === box.current) onClose();
      }}
      className="m-auto w-[min(560px,calc(100vw-32px))] rounded border-b-3 border-t-2 border-double border-ink bg-sheet p-0 text-ink shadow-over [border-top-style:solid] backdrop:bg-[rgb(11_17_14/.45)]"
    >
      <div className="p-6 phone:p-4">
        <h2 id={titleId} className="mb-3">
          {title}
        </h2>
        {children}
        {actions && <div className="mt-5 flex flex-wrap items-center gap-3">{actions}</div>}
      </div>
    </dialog>
  );
}
