/**
 * Heat that the surroundings give to a vessel [W]: into the wall, or into the fluid where there is no wall.
 *
 * Insulation and fire proofing stand in series with the outer film: 1/U = 1/h + Σ s/k. Films and fire act on the inside area, which leaves out the thickness.
 */
import type { BlowdownCase } from "../cases/blowdown-case";
import { EngineError } from "../errors";
import type { MeasuredVessel } from "../vessel/geometry";
import { levelTable } from "../vessel/level-table";
import { environmentFactorOf, fluxBehind, type FireProofing } from "./fire-proofing";
import { poolFireHeatW } from "./pool-fire";
import { fireFluxWPerM2 } from "./surface-fire";

export type OutsideHeat = (outerSurfaceK: number, liquidVolumeM3: number) => number;

export function outsideHeat(
  { heat: { outside }, vessel: { wall, geometry } }: BlowdownCase,
  vessel: MeasuredVessel,
): OutsideHeat {
  const area = vessel.innerAreaM2 ?? 0;
  switch (outside.model) {
    case "adiabatic":
      return () => 0;
    case "constant-heat":
      return () => outside.heatW;
    case "ambient": {
      const layers = [wall?.insulation, wall?.fireProofing].flatMap((layer) => layer ?? []);
      const resistance = layers.reduce(
        (sum, layer) => sum + layer.thicknessM / layer.conductivityWPerMK,
        1 / outside.coefficientWPerM2K,
      );
      return (T) => (area * (outside.temperatureK - T)) / resistance;
    }
    case "pool-fire":
      return poolFire(outside, vessel, geometry.shape === "sphere", wall?.fireProofing);
    case "surface-fire": {
      const exposed = area * (outside.factor ?? 1);
      const layer = wall?.fireProofing;
      if (layer && outside.heatFluxWPerM2 !== undefined) {
        throw new EngineError(
          "invalid-case",
          "A stated flux is what the steel takes up, whatever stands before it. Leave out the flux, or the fire proofing.",
          {},
          "vessel.wall.fireProofing",
        );
      }
      if (layer) return (T) => exposed * fluxBehind(layer, (surfaceK) => fireFluxWPerM2(outside.basis, surfaceK), T);
      return (T) => exposed * (outside.heatFluxWPerM2 ?? fireFluxWPerM2(outside.basis, T));
    }
  }
}

type PoolFire = Extract<BlowdownCase["heat"]["outside"], { model: "pool-fire" }>;

/** Flames of a pool reach so high above the ground; of a sphere the lower half counts even where it lies above. */
const flamesReachM = 7.6;

function poolFire(
  { drainage, environmentFactor, factor = 1, bottomAboveGroundM }: PoolFire,
  vessel: MeasuredVessel,
  isSphere: boolean,
  layer: FireProofing | undefined,
): OutsideHeat {
  const { below, heightM } = vessel;
  const table = levelTable(vessel);
  if (!below || !table || heightM === undefined) {
    throw new EngineError(
      "not-applicable",
      "A pool fire heats the wetted surface, which a plain volume does not tell. Give the vessel's shape, or a constant heat.",
      {},
      "vessel.geometry",
    );
  }
  const reachedM =
    bottomAboveGroundM === undefined ? heightM : Math.max(flamesReachM - bottomAboveGroundM, isSphere ? heightM / 2 : 0);
  const reachedM2 = reachedM >= heightM ? Number.POSITIVE_INFINITY : below(reachedM).areaM2;
  return (T, liquidVolumeM3) => {
    const wettedM2 = Math.min(table.at(liquidVolumeM3).areaM2, reachedM2);
    const covered = layer ? environmentFactorOf(layer, T) : 1;
    return poolFireHeatW(wettedM2, drainage, factor * environmentFactor * covered);
  };
}
