import type { ReactNode } from "react";

/**
 * One figure set large.
 *
 * label   small type above ("Governing figure, line 7.02")
 * value   the number as shown
 * rest    unit and what belongs to it, smaller ("°C at 21.4 min")
 */
export function Figure({ label, value, rest }: { label: ReactNode; value: ReactNode; rest?: ReactNode }) {
  return (
    <div className="unbroken">
      <p className="text-small text-ink-3">{label}</p>
      <p className="mt-[5px] text-fig font-medium tracking-[-.01em]">
        {value}
        {rest && <span className="text-sub font-normal tracking-normal"> {rest}</span>}
      </p>
    </div>
  );
}
