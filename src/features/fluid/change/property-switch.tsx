"use client";

import { properties, type Property } from "./step-words";

/** Which property the drawing and the words show. */
export function PropertySwitch({ property, onChange }: { property: Property; onChange: (property: Property) => void }) {
  return (
    <div role="group" aria-label="Property shown" className="inline-flex rounded border border-rule-3 bg-sheet print:hidden">
      {properties.map(({ key, name }) => (
        <button
          key={key}
          type="button"
          aria-pressed={property === key}
          onClick={() => onChange(key)}
          className="flex min-h-[34px] items-center justify-center border-r border-rule-3 px-3 text-small text-ink-2 last:border-r-0 aria-pressed:bg-ink aria-pressed:font-semibold aria-pressed:text-sheet phone:min-h-[44px]"
        >
          {name}
        </button>
      ))}
    </div>
  );
}
