import { MarginHead, MarginNote } from "@/components/shell/margin";

/** What the small curve in every list is. Drawn without figures of any record. */
export function HowToReadAnEbb() {
  return (
    <>
      <MarginHead>How to read an ebb</MarginHead>
      <svg width="276" height="72" viewBox="0 0 276 72" aria-hidden="true" fill="none" className="max-w-full">
        <path d="M2 70h272" className="stroke-rule-3" />
        <path
          d="M3 5C20 20 45 34 75 45C110 57 150 62 190 65C220 66.5 250 67 274 67.5"
          className="stroke-tide"
          strokeWidth="2"
          strokeLinejoin="round"
        />
        <path d="M148 5V70" className="stroke-ink" strokeWidth="1.5" strokeDasharray="3 2" />
      </svg>
      <MarginNote>
        Each record carries its own computed pressure curve. The dashed post stands at the time the target pressure is reached;
        the width is twice the time allowed. Empty axes: not computed yet.
      </MarginNote>
    </>
  );
}
