"use client";

import { useId, type ComponentPropsWithRef, type ReactNode } from "react";
import { buttonLook, type ButtonKind } from "./button-look";

type Props = Omit<ComponentPropsWithRef<"button">, "className" | "style" | "disabled"> & {
  kind?: ButtonKind;
  /** Fills the width it is given. */
  full?: boolean;
  /** Why it can't be pressed now. Given a reason the button is disabled and the reason stands after it. */
  waitsFor?: ReactNode;
  /** The work is under way: it can't be pressed again, and says so. */
  busy?: boolean;
};

/**
 * A button; `type="button"` unless said otherwise. A button that can't be pressed keeps its place in the tab order and is followed by its
 * reason, so that nobody has to guess.
 */
export function Button({ kind = "plain", full, waitsFor, busy = false, onClick, children, type = "button", ...rest }: Props) {
  const reasonId = useId();
  const stopped = Boolean(waitsFor) || busy;

  return (
    <>
      <button
        {...rest}
        type={type}
        aria-disabled={stopped || undefined}
        aria-busy={busy || undefined}
        aria-describedby={waitsFor ? reasonId : rest["aria-describedby"]}
        onClick={stopped ? (event) => event.preventDefault() : onClick}
        className={buttonLook(kind, full)}
      >
        {children}
      </button>
      {waitsFor && (
        <span id={reasonId} className="text-small text-ink-2">
          {waitsFor}
        </span>
      )}
    </>
  );
}
