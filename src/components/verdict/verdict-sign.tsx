import type { ReactNode } from "react";
import type { Verdict } from "./verdict";

const drawings: Record<Verdict, ReactNode> = {
  within: (
    <>
      <path d="M1 6h16" />
      <circle cx="9" cy="13" r="3.2" fill="currentColor" stroke="none" />
    </>
  ),
  near: (
    <>
      <path d="M1 9h4M13 9h4" />
      <circle cx="9" cy="9" r="3.6" />
      <path d="M9 5.4a3.6 3.6 0 0 1 0 7.2z" fill="currentColor" stroke="none" />
    </>
  ),
  beyond: (
    <>
      <path d="M1 13h16" />
      <path d="M9 1.2l5 8H4z" fill="currentColor" stroke="none" />
    </>
  ),
  open: <circle cx="9" cy="9" r="4.2" strokeDasharray="2.4 2" />,
};

/** A mark and a level: dot under the line, ring on it, triangle over it, dashed ring without one. Never shown without its word. */
export function VerdictSign({ verdict, size = 18 }: { verdict: Verdict; size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 18 18"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.8"
      aria-hidden="true"
      data-sign={verdict}
      className="mr-[7px] flex-none align-[-.2em]"
    >
      {drawings[verdict]}
    </svg>
  );
}
