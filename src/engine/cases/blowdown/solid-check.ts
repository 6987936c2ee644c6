/**
 * Does a component freeze out of what is in the vessel?
 *
 * Carbon dioxide: alone, its pressure against the sublimation pressure; in a mixture, its fugacity against that of its solid
 *
 *   ln(p_sub/p_t) = (T_t/T) [−14.740846 θ + 2.4327015 θ^1.9 − 5.3061778 θ^2.9],  θ = 1 − T/T_t
 *   f_solid = p_sub φ_sub exp[v_s (p − p_sub)/(R T)],  v_s = 2.8e-5 m³/mol
 *
 * Source   Span and Wagner, J. Phys. Chem. Ref. Data 25 (1996) 1509, equation 3.12; the solid's molar volume is a rounded textbook value.
 * Other components: no sublimation line is held. A pure one is called solid below its triple point; in a mixture that is a warning.
 * Returns  above zero while nothing freezes
 */
import type { FluidModel } from "../../eos/fluid-model";
import { createPhaseState } from "../../eos/fluid-model";
import type { FluidSpec } from "../fluid-spec";
import { findLibraryRow } from "../../substances/library";
import type { Contents } from "./contents";

export type SolidCurve = {
  index: number;
  id: string;
  triplePointK: number;
  pure: boolean;
  sublimationPa?: (temperatureK: number) => number;
};

const tripleK = 216.592;
const triplePa = 517950;
const solidVolumeM3PerMol = 2.8e-5;

export function carbonDioxideSublimationPa(temperatureK: number): number {
  const q = 1 - temperatureK / tripleK;
  return triplePa * Math.exp((tripleK / temperatureK) * (-14.740846 * q + 2.4327015 * q ** 1.9 - 5.3061778 * q ** 2.9));
}

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
      const ratio = solidFugacity(fluid, curve.sublimationPa, contents) / fugacity(fluid, curve.index, contents);
      margin = Math.min(margin, Math.log(ratio));
    }
  }
  return margin;
}

const scratch = createPhaseState();

function solidFugacity(
  fluid: FluidModel,
  sublimationPa: (T: number) => number,
  { temperatureK: T, pressurePa: p }: Contents,
): number {
  const sublimation = sublimationPa(T);
  const R = fluid.gasConstantJPerMolK;
  // φ of the vapour over the solid: within 2 % of one below the triple point of carbon dioxide's 5.2 bar; its second virial estimate.
  const reduced = T / 304.1282;
  const virial = 0.083 - 0.422 / reduced ** 1.6 + 0.22394 * (0.139 - 0.172 / reduced ** 4.2);
  const lnPhi = (virial * sublimation * 304.1282) / (7377300 * T);
  return sublimation * Math.exp(lnPhi + (solidVolumeM3PerMol * (p - sublimation)) / (R * T));
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
