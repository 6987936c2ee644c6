import type { FluidSpec } from "../../cases/fluid-spec";
import { EngineError } from "../../errors";
import type { HeatCapacity } from "../../substances/heat-capacity";
import type { Substance } from "../../substances/substance";
import { notTranslated } from "../cubic/volume-translation";
import { deriveFluidModel } from "../derive-fluid-model";
import type { FluidModel } from "../fluid-model";
import { createIdealGasModel } from "../ideal-gas";
import { referenceFluids, type ReferenceFluid } from "./reference-data";
import { ReferenceResidual } from "./reference-residual";

/** How far past its published temperatures an equation is evaluated at all; past them a warning is due. */
const stretch = { below: 0.6, above: 1.3 };

/** A pure fluid by its own multiparameter equation. */
export function buildReference(fluid: FluidSpec, substances: readonly Substance[], feed: Float64Array): FluidModel {
  if (substances.length !== 1) {
    throw new EngineError(
      "not-applicable",
      "a reference equation describes one pure fluid; choose GERG-2008 or a cubic equation for a mixture",
      { components: substances.length },
      "fluid.components",
    );
  }
  if (fluid.volumeTranslation && fluid.volumeTranslation !== "none") throw notTranslated("GERG-2008 and reference equations");
  const substance = substances[0]!;
  const data = substance.origin === "library" ? referenceFluids.get(substance.id) : undefined;
  if (!data) {
    throw new EngineError(
      "not-applicable",
      `no reference equation is held for "${substance.id}"; there is one for ${[...referenceFluids.keys()].join(", ")}`,
      {},
      "fluid.components[0].id",
    );
  }
  const own: Substance = {
    ...substance,
    molarMassKgPerMol: data.molarMass_kg_per_mol,
    criticalTemperatureK: data.critical.T_K,
    criticalPressurePa: data.critical.p_Pa,
    acentricFactor: data.acentricFactor,
    heatCapacity: idealHeatCapacity(data),
    heatCapacityRangeK: [data.validity.Tmin_K, data.validity.Tmax_K],
    triplePointK: data.triple.T_K,
  };
  return deriveFluidModel({
    equation: "reference",
    substances: [own],
    molarMassesKgPerMol: Float64Array.of(data.molarMass_kg_per_mol),
    feed,
    gasConstantJPerMolK: data.R_J_per_molK,
    temperatureRangeK: [stretch.below * data.validity.Tmin_K, stretch.above * data.validity.Tmax_K],
    notes: [`Reference equation: ${data.citation}`],
    residual: new ReferenceResidual(data),
    idealHelmholtz: createIdealGasModel([own.heatCapacity], data.R_J_per_molK),
  });
}

/**
 * cp0/R from the ideal part α0(τ): 1 + a of log τ, −n t (t − 1) τ^t of a power, the Planck-Einstein terms as they stand.
 * What is linear in τ or constant only moves the zero, which the engine sets itself.
 */
function idealHeatCapacity({ ideal, reducing }: ReferenceFluid): HeatCapacity {
  let c0 = 1;
  const terms: { n: number; thetaK: number }[] = [];
  const powers: { k: number; q: number }[] = [];
  for (const term of ideal) {
    if (term.type === "log_tau") c0 += term.a;
    if (term.type === "planck_einstein") {
      for (const { n, theta } of term.terms) terms.push({ n, thetaK: theta * reducing.T_K });
    }
    if (term.type === "power") {
      for (const { n, t } of term.terms) {
        if (t !== 0 && t !== 1) powers.push({ k: -n * t * (t - 1) * reducing.T_K ** t, q: -t });
      }
    }
  }
  return { form: "planck-einstein", c0, terms, powers };
}
