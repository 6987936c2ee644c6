import type { FluidSpec } from "../../cases/fluid-spec";
import { gasConstant } from "../../gas-constant";
import type { Substance } from "../../substances/substance";
import { deriveFluidModel } from "../derive-fluid-model";
import type { FluidModel } from "../fluid-model";
import { createIdealGasModel } from "../ideal-gas";
import { interactionMatrix } from "../interaction-matrix";
import { cubicEquations, type CubicEquation, type CubicEquationId } from "./cubic-equations";
import { CubicResidual } from "./cubic-residual";
import { TranslatedResidual } from "./translated-residual";
import { volumeShift } from "./volume-translation";

/** Below this no cubic and no heat-capacity form means anything for the fluids in the library but helium. */
const minimumTemperatureK = 10;
const maximumTemperatureK = 2500;

export function buildCubic(
  id: CubicEquationId,
  fluid: FluidSpec,
  substances: readonly Substance[],
  feed: Float64Array,
): FluidModel {
  const equation: CubicEquation = cubicEquations[id];
  const { kij, notes } = interactionMatrix(fluid, substances, equation.interaction);
  const residual = new CubicResidual(equation, substances, kij);
  const shift = volumeShift(fluid, substances, equation.interaction);
  return deriveFluidModel({
    equation: id,
    substances,
    molarMassesKgPerMol: Float64Array.from(substances, (substance) => substance.molarMassKgPerMol),
    feed,
    gasConstantJPerMolK: gasConstant,
    temperatureRangeK: [minimumTemperatureK, Math.min(maximumTemperatureK, residual.maximumTemperatureK)],
    notes: [...substances.flatMap((substance) => substance.notes), ...notes, ...(shift ? shift.notes : [])],
    residual: shift ? new TranslatedResidual(residual, shift.c) : residual,
    idealHelmholtz: createIdealGasModel(substances.map((substance) => substance.heatCapacity)),
  });
}
