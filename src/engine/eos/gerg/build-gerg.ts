import type { FluidSpec } from "../../cases/fluid-spec";
import { EngineError } from "../../errors";
import type { Substance } from "../../substances/substance";
import { notTranslated } from "../cubic/volume-translation";
import { deriveFluidModel } from "../derive-fluid-model";
import type { FluidModel } from "../fluid-model";
import { createIdealGasModel } from "../ideal-gas";
import { ReducedTerms } from "../reference/reduced-terms";
import { gergComponents, gergConstants, gergHeatCapacity, gergResidualTerms, gergValidity } from "./gerg-data";
import { GergResidual } from "./gerg-residual";

/** A mixture of the 21 components of GERG-2008. Interaction parameters belong to the equation: `interaction` has no effect. */
export function buildGerg(fluid: FluidSpec, substances: readonly Substance[], feed: Float64Array): FluidModel {
  substances.forEach(({ id, origin }, index) => {
    if (origin === "library" && gergComponents.has(id)) return;
    throw new EngineError(
      "not-applicable",
      `GERG-2008 has no component "${id}"; it covers ${[...gergComponents.keys()].join(", ")}`,
      {},
      `fluid.components[${index}].id`,
    );
  });
  if (Array.isArray(fluid.interaction) && fluid.interaction.length > 0) {
    throw new EngineError(
      "not-applicable",
      "GERG-2008 keeps its own interaction parameters; remove the list of kij",
      {},
      "fluid.interaction",
    );
  }
  if (fluid.volumeTranslation && fluid.volumeTranslation !== "none") throw notTranslated("GERG-2008 and reference equations");
  const own = substances.map((substance): Substance => {
    const row = gergComponents.get(substance.id)!;
    return {
      ...substance,
      molarMassKgPerMol: row.molarMass_kg_per_mol,
      criticalTemperatureK: row.Tc_K,
      criticalPressurePa: criticalPressure(substance.id),
      heatCapacity: gergHeatCapacity(substance.id),
      heatCapacityRangeK: gergValidity.extended.T_K,
    };
  });
  return deriveFluidModel({
    equation: "gerg-2008",
    substances: own,
    molarMassesKgPerMol: Float64Array.from(own, ({ molarMassKgPerMol }) => molarMassKgPerMol),
    feed,
    gasConstantJPerMolK: gergConstants.R,
    temperatureRangeK: [30, 1000],
    notes: [],
    residual: new GergResidual(own.map(({ id }) => id)),
    idealHelmholtz: createIdealGasModel(
      own.map(({ heatCapacity }) => heatCapacity),
      gergConstants.R,
    ),
  });
}

const criticalPressures = new Map<string, number>();

/** p = ρc R Tc (1 + δ αr_δ) at δ = τ = 1: the pressure that the equation itself has at its critical temperature and density. */
function criticalPressure(id: string): number {
  let found = criticalPressures.get(id);
  if (found === undefined) {
    const { Tc_K, rhoc_mol_per_m3 } = gergComponents.get(id)!;
    const terms = new ReducedTerms([gergResidualTerms(id)]);
    terms.evaluate(1, 1);
    found = rhoc_mol_per_m3 * gergConstants.R * Tc_K * (1 + terms.sums[1]!);
    criticalPressures.set(id, found);
  }
  return found;
}
