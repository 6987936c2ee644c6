import type { ReactNode } from "react";
import { WarningSign } from "./warning-sign";

/**
 * A field outside the sheet's lines (sign-in, signature, people): label above, message beneath. The message's id is `<id>-message`.
 *
 * id   of the control inside
 */
export function Labelled({
  id,
  label,
  hint,
  error,
  children,
}: {
  id: string;
  label: ReactNode;
  hint?: ReactNode;
  error?: ReactNode;
  children: ReactNode;
}) {
  return (
    <div className="mt-3.5">
      <label htmlFor={id} className="mb-[5px] block font-medium">
        {label}
      </label>
      {children}
      {error ? (
        <p id={`${id}-message`} className="flex items-baseline gap-2 pt-1 text-note text-beyond">
          <span className="relative top-0.5">
            <WarningSign />
          </span>
          <span>{error}</span>
        </p>
      ) : (
        hint && (
          <p id={`${id}-message`} className="pt-1 text-label text-ink-3">
            {hint}
          </p>
        )
      )}
    </div>
  );
}
