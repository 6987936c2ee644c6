import type { ComponentSpec } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import { findLibraryRow, librarySubstance } from "./library";
import { pseudoSubstance } from "./pseudo-component";
import type { Substance } from "./substance";

/** A component of a case document as a substance. Throws EngineError with the path of the field. */
export function resolveComponent(spec: ComponentSpec, index: number): Substance {
  const path = `fluid.components[${index}]`;
  if (spec.custom && spec.pseudo) {
    throw new EngineError("invalid-case", "give either pseudo or custom for one component, not both", {}, path);
  }
  if (spec.custom) return customSubstance(spec, `${path}.custom`);
  if (spec.pseudo) {
    try {
      return pseudoSubstance(spec.id, spec.pseudo.molarMassKgPerMol, spec.pseudo.relativeDensity);
    } catch (error) {
      throw error instanceof EngineError ? error.at(`${path}.pseudo`) : error;
    }
  }
  const row = findLibraryRow(spec.id);
  if (!row) {
    throw new EngineError(
      "invalid-case",
      `"${spec.id}" is not in the component library; choose a listed id, or give pseudo or custom constants`,
      {},
      `${path}.id`,
    );
  }
  return librarySubstance(row);
}

function customSubstance(spec: ComponentSpec, path: string): Substance {
  const custom = spec.custom!;
  const positive = ["molarMassKgPerMol", "criticalTemperatureK", "criticalPressurePa"] as const;
  for (const key of positive) {
    if (!(custom[key] > 0 && Number.isFinite(custom[key]))) {
      throw new EngineError("invalid-case", `${key} must be a positive number`, {}, `${path}.${key}`);
    }
  }
  if (!(custom.acentricFactor > -1 && custom.acentricFactor < 2)) {
    throw new EngineError("invalid-case", "acentricFactor must lie between -1 and 2", {}, `${path}.acentricFactor`);
  }
  const { polynomial, rangeK } = custom.idealGasHeatCapacityOverR;
  if (polynomial.length < 1 || polynomial.length > 8 || !polynomial.every(Number.isFinite)) {
    throw new EngineError(
      "invalid-case",
      "the heat capacity polynomial needs one to eight finite coefficients",
      {},
      `${path}.idealGasHeatCapacityOverR.polynomial`,
    );
  }
  if (!(rangeK[0] > 0 && rangeK[1] > rangeK[0])) {
    throw new EngineError(
      "invalid-case",
      "rangeK must be two rising temperatures above 0 K",
      {},
      `${path}.idealGasHeatCapacityOverR.rangeK`,
    );
  }
  return {
    id: spec.id,
    name: spec.id,
    origin: "custom",
    molarMassKgPerMol: custom.molarMassKgPerMol,
    criticalTemperatureK: custom.criticalTemperatureK,
    criticalPressurePa: custom.criticalPressurePa,
    acentricFactor: custom.acentricFactor,
    heatCapacity: { form: "polynomial", coefficients: polynomial },
    heatCapacityRangeK: rangeK,
    notes: [`${spec.id}: constants entered by the user.`],
  };
}
