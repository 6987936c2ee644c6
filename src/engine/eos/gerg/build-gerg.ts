import type { FluidSpec } from "../../cases/fluid-spec";
import { EngineError } from "../../errors";
import type { Substance } from "../../substances/substance";
import { deriveFluidModel } from "../derive-fluid-model";
import type { FluidModel } from "../fluid-model";
import { createIdealGasModel } from "../ideal-gas";
import { gergComponents, gergConstants, gergHeatCapacity, gergValidity } from "./gerg-data";
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
  const own = substances.map((substance): Substance => {
    const row = gergComponents.get(substance.id)!;
    return {
      ...substance,
      molarMassKgPerMol: row.molarMass_kg_per_mol,
      criticalTemperatureK: row.Tc_K,
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
