import type { ReactNode } from "react";
import { WarningSign } from "../line/warning-sign";

/**
 * Something that must be read where it stands; never a message that floats and fades.
 *
 * tone       `error` interrupts a reader by ear (role alert), `caution` waits its turn (role status)
 * title      set bold before the words ("Not kept since 14:36.")
 * children   what it means and what to do
 */
export function Notice({ tone, title, children }: { tone: "caution" | "error"; title?: ReactNode; children?: ReactNode }) {
  const look = tone === "error" ? "border-beyond bg-beyond-wash text-beyond" : "border-near bg-near-wash text-near";
  return (
    <div
      role={tone === "error" ? "alert" : "status"}
      className={`unbroken flex gap-2.5 border-b border-t-2 px-[18px] py-3.5 print:border-1.5 ${look}`}
    >
      <span className="relative top-0.5">
        <WarningSign size={18} />
      </span>
      <div className="min-w-0 [&_a]:text-inherit">
        {title && <b>{title}</b>} {children}
      </div>
    </div>
  );
}
