/**
 * Heat that the surroundings give to a vessel [W]: into the wall, or into the fluid where there is no wall.
 *
 * Insulation stands in series with the outer film: 1/U = 1/h + s/k. Films and fire act on the inside area, which leaves out the thickness.
 */
import type { BlowdownCase } from "../cases/blowdown-case";
import { EngineError } from "../errors";
import { levelAtVolume, type MeasuredVessel } from "../vessel/geometry";
import { poolFireHeatW } from "./pool-fire";
import { fireFluxWPerM2 } from "./surface-fire";

export type OutsideHeat = (outerSurfaceK: number, liquidVolumeM3: number) => number;

export function outsideHeat({ heat: { outside }, vessel: { wall } }: BlowdownCase, vessel: MeasuredVessel): OutsideHeat {
  const area = vessel.innerAreaM2 ?? 0;
  switch (outside.model) {
    case "adiabatic":
      return () => 0;
    case "constant-heat":
      return () => outside.heatW;
    case "ambient": {
      const resistance =
        1 / outside.coefficientWPerM2K + (wall?.insulation ? wall.insulation.thicknessM / wall.insulation.conductivityWPerMK : 0);
      return (T) => (area * (outside.temperatureK - T)) / resistance;
    }
    case "pool-fire":
      return poolFire(outside, vessel);
    case "surface-fire": {
      const exposed = area * (outside.factor ?? 1);
      return (T) => exposed * (outside.heatFluxWPerM2 ?? fireFluxWPerM2(outside.basis, T));
    }
  }
}

type PoolFire = Extract<BlowdownCase["heat"]["outside"], { model: "pool-fire" }>;

function poolFire({ drainage, environmentFactor, factor = 1 }: PoolFire, vessel: MeasuredVessel): OutsideHeat {
  const { below } = vessel;
  if (!below) {
    throw new EngineError(
      "not-applicable",
      "A pool fire heats the wetted surface, which a plain volume does not tell. Give the vessel's shape, or a constant heat.",
      {},
      "vessel.geometry",
    );
  }
  return (_T, liquidVolumeM3) => {
    const level = levelAtVolume(vessel, liquidVolumeM3) ?? 0;
    return poolFireHeatW(below(level).areaM2, drainage, factor * environmentFactor);
  };
}
