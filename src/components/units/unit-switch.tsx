"use client";

import { unitSystems, type UnitSystem } from "./unit-system";
import { useUnits } from "./units-provider";

/**
 * SI or US, shown everywhere at once.
 *
 * onChange   told of the choice after it took effect, for whoever keeps a person's preferences.
 */
export function UnitSwitch({ onChange }: { onChange?: (system: UnitSystem) => void }) {
  const { system, setSystem } = useUnits();

  return (
    <div role="group" aria-label="Units shown" className="inline-flex rounded border border-rule-3 bg-sheet">
      {unitSystems.map((option) => (
        <button
          key={option}
          type="button"
          aria-pressed={system === option}
          onClick={() => {
            setSystem(option);
            onChange?.(option);
          }}
          className="flex min-h-[34px] items-center justify-center border-r border-rule-3 px-3 text-ink-2 last:border-r-0 aria-pressed:bg-ink aria-pressed:font-semibold aria-pressed:text-sheet phone:min-h-[44px] phone:min-w-[44px]"
        >
          {option}
        </button>
      ))}
    </div>
  );
}
