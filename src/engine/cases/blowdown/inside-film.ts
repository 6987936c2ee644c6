/**
 * Heat from the wall's inner surface to the contents [W], by published correlations: natural convection on the dry part, natural convection
 * or nucleate boiling, whichever is more, on the wetted part.
 *
 * Without a known shape there is no wetted area, and the whole inside counts as dry (a warning says so).
 */
import type { FluidModel } from "../../eos/fluid-model";
import type { EquilibriumPhase } from "../../flash/equilibrium";
import { cooperFlux, zuberLimitWPerM2 } from "../../heat/boiling";
import { naturalConvection, type FilmFlux } from "../../heat/natural-convection";
import { brockBirdSurfaceTension } from "../../transport/surface-tension";
import { findLibraryRow } from "../../substances/library";
import { levelAtVolume, type MeasuredVessel } from "../../vessel/geometry";
import type { Contents } from "./contents";

/** Where no component's boiling point is held, as for constants of the user's own. */
const typicalSurfaceTensionNPerM = 0.01;

export function correlatedFilmW(fluid: FluidModel, vessel: MeasuredVessel, contents: Contents): (differenceK: number) => number {
  const area = vessel.innerAreaM2 ?? 0;
  const light = naturalConvection(fluid, contents.lightest, contents.lightestComposition);
  const [vapour, liquid] = contents.equilibrium?.phases ?? [];
  if (!vapour || !liquid || !vessel.below) return (dT) => area * light(dT);

  const wetted = vessel.below(levelAtVolume(vessel, contents.liquidVolumeM3) ?? 0).areaM2;
  const wet = wettedFlux(fluid, vapour, liquid);
  return (dT) => (area - wetted) * light(dT) + wetted * wet(dT);
}

function wettedFlux(fluid: FluidModel, vapour: EquilibriumPhase, liquid: EquilibriumPhase): FilmFlux {
  const { state, composition } = liquid;
  const convection = naturalConvection(fluid, state, composition);
  const molarMass = fluid.mixtureMolarMass(composition);
  const mean = (values: ArrayLike<number>): number => composition.reduce((sum, x, i) => sum + x * (values[i] ?? 0), 0);
  const boiling = cooperFlux(state.pressurePa / mean(fluid.criticalPressuresPa), molarMass * 1000);
  const limit = zuberLimitWPerM2({
    latentHeatJPerKg:
      vapour.state.enthalpyJPerMol / fluid.mixtureMolarMass(vapour.composition) - state.enthalpyJPerMol / molarMass,
    vapourDensityKgPerM3: vapour.state.densityKgPerM3,
    liquidDensityKgPerM3: state.densityKgPerM3,
    surfaceTensionNPerM: surfaceTension(fluid, composition, state.temperatureK),
  });
  return (dT) => (dT <= 0 ? convection(dT) : Math.max(convection(dT), Math.min(boiling(dT), Math.max(limit, 0))));
}

export function surfaceTension(fluid: FluidModel, x: Float64Array, temperatureK: number): number {
  let sum = 0;
  let known = 0;
  fluid.componentIds.forEach((id, i) => {
    const row = findLibraryRow(id);
    if (!row) return;
    known += x[i] ?? 0;
    sum +=
      (x[i] ?? 0) *
      brockBirdSurfaceTension(
        { criticalTemperatureK: row.Tc_K, criticalPressurePa: row.Pc_Pa, normalBoilingPointK: row.normalBoilingPoint_K },
        temperatureK,
      );
  });
  return known > 0.5 ? sum / known : typicalSurfaceTensionNPerM;
}
