/** Says that a field opens a list. Lies over the field's end and lets clicks through. */
export function Chevron() {
  return (
    <svg
      width="9"
      height="6"
      viewBox="0 0 9 6"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.4"
      className="pointer-events-none absolute right-2 top-1/2 -translate-y-1/2 text-ink-2"
    >
      <path d="M1 1l3.5 3.5L8 1" />
    </svg>
  );
}
