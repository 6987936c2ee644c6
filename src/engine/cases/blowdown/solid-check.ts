/**
 * Does a component freeze out of what is in the vessel?
 *
 * Carbon dioxide: alone, its pressure against the sublimation pressure; in a mixture, its fugacity against that of its solid
 * (src/engine/solids/solid-lines.ts, with the source).
 * Other components: no sublimation line is held. A pure one is called solid below its triple point; in a mixture that is a warning.
 * Returns  above zero while nothing freezes
 */
import type { FluidModel } from "../../eos/fluid-model";
import { createPhaseState } from "../../eos/fluid-model";
import type { FluidSpec } from "../fluid-spec";
import { carbonDioxideSublimationLine, carbonDioxideTriple, solidCarbonDioxideFugacity } from "../../solids/solid-lines";
import { findLibraryRow } from "../../substances/library";
import type { Contents } from "./contents";

export type SolidCurve = {
  index: number;
  id: string;
  triplePointK: number;
  pure: boolean;
  sublimationPa?: (temperatureK: number) => number;
};

const tripleK = carbonDioxideTriple.temperatureK;

export const carbonDioxideSublimationPa = carbonDioxideSublimationLine;

/** Components of the fluid for which solid is looked at: a pure fluid with a known triple point, and carbon dioxide anywhere. */
export function solidCurves(fluid: FluidSpec): SolidCurve[] {
  const present = fluid.components.flatMap(({ id, moleFraction, custom, pseudo }, index) =>
    moleFraction > 0 && !custom && !pseudo ? [{ id, index }] : [],
  );
  const pure = fluid.components.filter(({ moleFraction }) => moleFraction > 0).length === 1;
  return present.flatMap(({ id, index }): SolidCurve[] => {
    const row = findLibraryRow(id);
    if (!row) return [];
    if (row.formula === "CO2") return [{ index, id, triplePointK: tripleK, pure, sublimationPa: carbonDioxideSublimationPa }];
    return pure ? [{ index, id, triplePointK: row.triplePoint.T_K, pure }] : [];
  });
}

export function solidMargin(fluid: FluidModel, contents: Contents, curves: readonly SolidCurve[]): number {
  let margin = Number.MAX_VALUE;
  for (const curve of curves) {
    const T = contents.temperatureK;
    if (T >= curve.triplePointK) margin = Math.min(margin, T / curve.triplePointK - 1 + 1e-12);
    else if (!curve.sublimationPa || (curve.pure && contents.phases === 2)) margin = Math.min(margin, T / curve.triplePointK - 1);
    else if (curve.pure) margin = Math.min(margin, Math.log(curve.sublimationPa(T) / contents.pressurePa));
    else {
      const ratio = solidFugacity(fluid, curve.index, contents) / fugacity(fluid, curve.index, contents);
      margin = Math.min(margin, Math.log(ratio));
    }
  }
  return margin;
}

const scratch = createPhaseState();

function solidFugacity(fluid: FluidModel, index: number, { temperatureK: T, pressurePa: p }: Contents): number {
  const pure = Float64Array.from(fluid.feed, (_, i) => (i === index ? 1 : 0));
  const lnPhi = new Float64Array(pure.length);
  return solidCarbonDioxideFugacity(T, p, (sublimationPa) =>
    Math.exp(fluid.lnFugacityCoefficients(T, sublimationPa, pure, "vapour", lnPhi)[index] ?? 0),
  );
}

function fugacity(
  fluid: FluidModel,
  index: number,
  { temperatureK, pressurePa, lightest, lightestComposition }: Contents,
): number {
  const root =
    lightest.molarVolumeM3PerMol >
    fluid.phaseAtPressure(temperatureK, pressurePa, lightestComposition, "liquid", scratch).molarVolumeM3PerMol * 1.000001
      ? "vapour"
      : "stable";
  const lnPhi = fluid.lnFugacityCoefficients(
    temperatureK,
    pressurePa,
    lightestComposition,
    root,
    new Float64Array(lightestComposition.length),
  );
  return pressurePa * (lightestComposition[index] ?? 0) * Math.exp(lnPhi[index] ?? 0);
}
