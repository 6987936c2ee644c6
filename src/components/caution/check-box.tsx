"use client";

type Props = { id?: string; checked: boolean; onChange: (checked: boolean) => void; disabled?: boolean; label?: string };

/** A box to tick; a native checkbox under our own drawing. Give it an id and a `<label htmlFor>`, or a `label`. */
export function CheckBox({ id, checked, onChange, disabled, label }: Props) {
  return (
    <span className="relative inline-grid h-6 w-6 flex-none place-items-center phone:h-7 phone:w-7">
      <input
        id={id}
        type="checkbox"
        aria-label={label}
        checked={checked}
        disabled={disabled}
        onChange={(event) => onChange(event.target.checked)}
        className="peer col-start-1 row-start-1 h-full w-full cursor-pointer appearance-none rounded border-2 border-rule-3 bg-field checked:border-ink checked:bg-ink disabled:cursor-not-allowed forced-colors:appearance-auto"
      />
      <svg
        width="14"
        height="12"
        viewBox="0 0 14 12"
        aria-hidden="true"
        fill="none"
        stroke="currentColor"
        strokeWidth="2.6"
        className="pointer-events-none col-start-1 row-start-1 hidden text-sheet peer-checked:block"
      >
        <path d="M1 6.5L5 10.5 13 1" />
      </svg>
    </span>
  );
}
