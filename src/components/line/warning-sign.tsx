/** The sign before a warning or an error, in the colour of its words. */
export function WarningSign({ size = 14 }: { size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 14 14"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
      className="flex-none"
    >
      <path d="M7 1l6 11H1z" strokeWidth="1.6" />
      <path d="M7 5v3.6M7 10v1" strokeWidth="1.5" />
    </svg>
  );
}
