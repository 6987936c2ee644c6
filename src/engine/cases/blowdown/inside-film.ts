/**
 * Heat from the wall's inner surface to the contents [W], by published correlations: natural convection on the dry part, natural convection
 * or nucleate boiling, whichever is more, on the wetted part.
 *
 * Both come in by degrees: a pool thinner than a film of 5 mm wets in proportion to its volume, and boiling grows with the vapour in a vessel
 * that is almost full. A film that jumped with the first droplet or bubble would make it vanish again, and so for ever.
 *
 * Without a known shape there is no wetted area, and the whole inside counts as dry (a warning says so).
 */
import type { FluidModel } from "../../eos/fluid-model";
import type { EquilibriumPhase } from "../../flash/equilibrium";
import { cooperFlux, zuberLimitWPerM2 } from "../../heat/boiling";
import { naturalConvection, type FilmFlux } from "../../heat/natural-convection";
import { brockBirdSurfaceTension } from "../../transport/surface-tension";
import { findLibraryRow } from "../../substances/library";
import type { MeasuredVessel } from "../../vessel/geometry";
import { levelTable } from "../../vessel/level-table";
import type { Contents } from "./contents";

const poolFilmM = 0.005;
/** Vapour's share of the volume. */
const boilsFullyAt = 0.02;

/** Where no component's boiling point is held, as for constants of the user's own. */
const typicalSurfaceTensionNPerM = 0.01;

export function correlatedFilmW(fluid: FluidModel, vessel: MeasuredVessel, contents: Contents): (differenceK: number) => number {
  const area = vessel.innerAreaM2 ?? 0;
  const light = naturalConvection(fluid, contents.lightest, contents.lightestComposition);
  const [vapour, liquid] = contents.equilibrium?.phases ?? [];
  if (!vapour || !liquid || !vessel.below) return (dT) => area * light(dT);

  const under = levelTable(vessel)?.at(contents.liquidVolumeM3).areaM2 ?? 0;
  const wetted = Math.min(under, contents.liquidVolumeM3 / poolFilmM);
  const boils = Math.min((1 - contents.liquidVolumeM3 / vessel.volumeM3) / boilsFullyAt, 1);
  const wet = wettedFlux(fluid, vapour, liquid, boils);
  return (dT) => (area - wetted) * light(dT) + wetted * wet(dT);
}

/** Fluxes on the dry and on the wetted part [W/m²], each by the state of the fluid that touches it. */
export function insideFilms(fluid: FluidModel, vessel: MeasuredVessel, contents: Contents): { dry: FilmFlux; wet: FilmFlux } {
  const dry = naturalConvection(fluid, contents.lightest, contents.lightestComposition);
  const [vapour, liquid] = contents.equilibrium?.phases ?? [];
  if (!vapour || !liquid) return { dry, wet: dry };
  const boils = Math.min((1 - contents.liquidVolumeM3 / vessel.volumeM3) / boilsFullyAt, 1);
  return { dry, wet: wettedFlux(fluid, vapour, liquid, boils) };
}

function wettedFlux(fluid: FluidModel, vapour: EquilibriumPhase, liquid: EquilibriumPhase, boils: number): FilmFlux {
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
  return (dT) => {
    const still = convection(dT);
    return dT <= 0 ? still : still + boils * Math.max(Math.min(boiling(dT), Math.max(limit, 0)) - still, 0);
  };
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
