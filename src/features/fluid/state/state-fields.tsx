"use client";

import { useId, useState } from "react";
import { UnitField } from "@/components/line/unit-field";
import { WarningSign } from "@/components/line/warning-sign";
import { useUnits } from "@/components/units/units-provider";
import { unitSymbols } from "@/engine/units";
import { inUnit, readTyped, shownTyped, unitApart, type StateQuantity, type Typed, type TypedState } from "./typed";

const words: Record<StateQuantity, string> = { pressure: "Pressure", temperature: "Temperature" };
const order: readonly StateQuantity[] = ["pressure", "temperature"];

/**
 * Pressure and temperature of one state, each with its unit.
 *
 * of   names the state for readers by ear ("state", "from", "to")
 */
export function StateFields({ of, state, onChange }: { of: string; state: TypedState; onChange: (state: TypedState) => void }) {
  return (
    <div className="grid grid-cols-[repeat(auto-fit,minmax(min(100%,214px),1fr))] gap-x-5 gap-y-2">
      {order.map((quantity) => (
        <StateField
          key={quantity}
          of={of}
          quantity={quantity}
          typed={state[quantity]}
          onChange={(typed) => onChange({ ...state, [quantity]: typed })}
        />
      ))}
    </div>
  );
}

type FieldProps = { of: string; quantity: StateQuantity; typed: Typed; onChange: (typed: Typed) => void };

function StateField({ of, quantity, typed, onChange }: FieldProps) {
  const { system, barometricPressurePa } = useUnits();
  const id = useId();
  // A unit of the other system, once typed or chosen, holds until the whole page is switched.
  const [typedIn, setTypedIn] = useState(system);
  const shown = typedIn === system ? typed : shownTyped(quantity, typed, system, barometricPressurePa);
  const change = (next: Typed) => {
    setTypedIn(system);
    onChange(next);
  };
  const read = readTyped(quantity, shown, barometricPressurePa);
  const problem = "problem" in read ? read.problem : undefined;
  return (
    <div className="min-w-0">
      <label htmlFor={id} className="mb-[5px] block font-medium">
        {words[quantity]}
        <span className="sr-only">, {of}</span>
      </label>
      <UnitField
        id={id}
        label={`${words[quantity]}, ${of}`}
        value={shown.text}
        unit={shown.unit}
        units={unitSymbols(quantity)}
        tone={problem ? "bad" : "rest"}
        describedBy={problem ? `${id}-problem` : undefined}
        onValueChange={(text) => change({ text, unit: shown.unit })}
        onUnitChange={(unit) => change(inUnit(quantity, shown, unit, barometricPressurePa))}
        onLeave={() => {
          const apart = unitApart(quantity, shown, barometricPressurePa);
          if (apart !== shown) change(apart);
        }}
      />
      {problem && (
        <p id={`${id}-problem`} role="alert" className="flex items-baseline gap-2 pt-1 text-note text-beyond">
          <span className="relative top-0.5">
            <WarningSign />
          </span>
          <span>{problem}</span>
        </p>
      )}
    </div>
  );
}
