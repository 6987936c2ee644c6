"use client";

import { useShown } from "@/components/quantity/quantity";
import { derivedValue } from "@/contracts/draft-derived";
import { liquidAtStart, shapeGeometry } from "@/contracts/draft-geometry";
import { valuesOf } from "@/contracts/draft-assemble";
import type { DerivedLine } from "@/contracts/lines/line";
import { lineByNo } from "@/contracts/lines/registry";
import type { OutletPlace } from "@/engine/cases/blowdown-case";
import { measureVessel } from "@/engine/vessel/geometry";
import { useForerunState } from "../forerun/forerun-context";
import { VesselFigure } from "../vessel/vessel-figure";
import { useDraft } from "./draft-context";

/**
 * The vessel of the draft, redrawn as it is typed. Liquid stands at the level typed; where pressure and temperature are given, at the one that
 * the forerun found.
 */
export function InventoryFigure() {
  const { draft, letter } = useDraft();
  const { result } = useForerunState();
  const geometry = shapeGeometry(draft);
  const { choice, si, asked } = valuesOf(draft, letter);
  if (!geometry || geometry.document.shape === "volume") return null;
  const typed = liquidAtStart(draft, geometry)?.levelM;
  const found = result?.series.liquidLevelM?.[0];
  const levelM = choice("2.08") === "pressure-temperature" ? found : typed;
  const derived = derivedValue(draft, lineByNo("4.16") as DerivedLine)?.si;
  return (
    <VesselFigure
      tag={choice("2.01")}
      geometry={geometry.document}
      levelM={levelM === undefined ? undefined : Math.min(levelM, geometry.measured.heightM ?? levelM)}
      outlet={choice("5.06") as OutletPlace}
      steelMassKg={asked("4.10") ? (si("4.10") ?? derived) : undefined}
    />
  );
}

/** What the start condition comes to, as the forerun found it. */
export function StartSentence() {
  const { result, document } = useForerunState();
  const shown = useShown();
  if (!result || !document) return null;
  const { initialPressurePa, initialTemperatureK, initialMassKg } = result.summary;
  const level = result.series.liquidLevelM?.[0];
  const geometry = document.vessel.geometry;
  const liquidM3 = level === undefined || geometry.shape === "volume" ? undefined : liquidVolume(geometry, level);
  const b = (text: string) => <b className="whitespace-nowrap font-num font-semibold text-ink">{text}</b>;
  return (
    <p className="border-b-3 border-double border-ink py-3 font-serif text-prose text-ink-2">
      Blowdown starts at {b(shown("pressure", initialPressurePa).text)}, {b(shown("temperature", initialTemperatureK).text)}
      {liquidM3 ? <> with {b(shown("volume", liquidM3).text)} of liquid</> : null}, {b(shown("mass", initialMassKg).text)} in all;
      solved as you type.
    </p>
  );
}

function liquidVolume(geometry: Parameters<typeof measureVessel>[0], levelM: number): number | undefined {
  return measureVessel(geometry).below?.(levelM).volumeM3;
}
