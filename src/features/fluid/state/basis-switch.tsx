"use client";

export type Basis = "mole" | "mass";

const options: { value: Basis; label: string }[] = [
  { value: "mole", label: "per mole" },
  { value: "mass", label: "per mass" },
];

/** Whether energies stand for each mole or each kilogram. */
export function BasisSwitch({ basis, onChange }: { basis: Basis; onChange: (basis: Basis) => void }) {
  return (
    <div role="group" aria-label="Energies shown" className="inline-flex rounded border border-rule-3 bg-sheet print:hidden">
      {options.map(({ value, label }) => (
        <button
          key={value}
          type="button"
          aria-pressed={basis === value}
          onClick={() => onChange(value)}
          className="flex min-h-[34px] items-center justify-center border-r border-rule-3 px-3 text-small text-ink-2 last:border-r-0 aria-pressed:bg-ink aria-pressed:font-semibold aria-pressed:text-sheet phone:min-h-[44px]"
        >
          {label}
        </button>
      ))}
    </div>
  );
}
