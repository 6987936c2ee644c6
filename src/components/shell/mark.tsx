/** The mark: a pressure falling through its line. Decorative wherever the name stands beside it. */
export function Mark({ size = 28 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 28 28" aria-hidden="true" fill="none" className="flex-none">
      <path d="M4 2v24M4 25.2h22" className="stroke-ink" strokeWidth="1.6" />
      <path d="M4 17h22" className="stroke-ink" strokeWidth="1.4" strokeDasharray="2.4 1.6" />
      <path
        d="M4 3L5 5.6L6 7.9L7 9.9L8 11.7L9 13.2L10 14.6L11 15.7L12 16.8L13 17.7L14 18.5L15 19.2L16 19.8L17 20.3L18 20.8L19 21.2L20 21.5L21 21.8L22 22.1L23 22.3L24 22.5L25 22.7L26 22.9"
        className="stroke-tide"
        strokeWidth="2.8"
        strokeLinecap="round"
        strokeLinejoin="round"
      />
      <circle cx="12.2" cy="17" r="3" className="fill-ink" />
    </svg>
  );
}
