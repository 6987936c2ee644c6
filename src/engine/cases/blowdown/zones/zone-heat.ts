/**
 * Heat between two zones of fluid, their walls and the surroundings [W].
 *
 * A lumped wall has one temperature for both zones. With a profile each zone has a wall of its own, the part that it touches; steel that changes sides as
 * the level moves takes its energy along. A pool fire heats the wetted part, every other outside heat acts by area.
 */
import type { FilmFlux } from "../../../heat/natural-convection";
import type { VesselModel } from "../vessel-model";
import type { Contents } from "../contents";
import { insideFilms } from "../inside-film";
import { surfaceTemperature } from "../heat-flows";

export type ZoneHeat = {
  vapourW: number;
  liquidW: number;
  fromOutsideVapourW: number;
  fromOutsideLiquidW: number;
  vapourSurfaceK: number;
  liquidSurfaceK: number;
};

export function zoneHeat(
  model: VesselModel,
  contents: Contents,
  { vapourK, liquidK }: { vapourK: number; liquidK: number },
  wallK: { vapour: number; liquid: number } | undefined,
  wettedM2: number,
): ZoneHeat {
  const { wall, insideAreaM2, outside, outsideActsOn, film, filmFactor } = model;
  const dryM2 = Math.max(insideAreaM2 - wettedM2, 0);
  const share = insideAreaM2 > 0 ? wettedM2 / insideAreaM2 : 0;
  const dryShare = outsideActsOn === "wetted" ? 0 : 1 - share;
  const wetShare = outsideActsOn === "wetted" ? 1 : share;
  const fromOutsideVapourW = dryShare > 0 ? dryShare * outside(wallK?.vapour ?? vapourK, contents.liquidVolumeM3) : 0;
  const fromOutsideLiquidW = wetShare > 0 ? wetShare * outside(wallK?.liquid ?? liquidK, contents.liquidVolumeM3) : 0;
  if (!wall || !wallK) {
    return {
      vapourW: fromOutsideVapourW,
      liquidW: fromOutsideLiquidW,
      fromOutsideVapourW,
      fromOutsideLiquidW,
      vapourSurfaceK: vapourK,
      liquidSurfaceK: liquidK,
    };
  }
  const films = film === "correlations" ? insideFilms(model.fluid, model.vessel, contents) : undefined;
  const scaled = (flux: FilmFlux | undefined): FilmFlux => (flux ? (dT) => filmFactor * flux(dT) : constant);
  const constant = (dT: number): number => (film !== "correlations" && film !== "none" ? film.coefficientWPerM2K * dT : 0);
  const side = (meanK: number, fluidK: number, areaM2: number, outsideW: number, flux: (dT: number) => number) => {
    const { inside, coupling } = wall.resistances(meanK);
    const still = meanK - (areaM2 > 0 ? outsideW / areaM2 : 0) * coupling;
    if (!(areaM2 > 0)) return { heatW: 0, surfaceK: still };
    const surfaceK = surfaceTemperature(flux, { stillK: still, fluidK, resistanceKPerW: inside });
    return { heatW: areaM2 * flux(surfaceK - fluidK), surfaceK };
  };
  const dry = side(wallK.vapour, vapourK, dryM2, fromOutsideVapourW, scaled(films?.dry));
  const wet = side(wallK.liquid, liquidK, wettedM2, fromOutsideLiquidW, scaled(films?.wet));
  return {
    vapourW: dry.heatW,
    liquidW: wet.heatW,
    fromOutsideVapourW,
    fromOutsideLiquidW,
    vapourSurfaceK: dry.surfaceK,
    liquidSurfaceK: wet.surfaceK,
  };
}
