import type { EquationId, FluidSpec } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import { cubicEquations, type CubicEquation, type CubicEquationId } from "./cubic/cubic-equations";
import { createFluidModel } from "./create-fluid-model";
import type { FluidModel } from "./fluid-model";

const cubic: Record<CubicEquationId, CubicEquation> = cubicEquations;

export type SpreadEntry = { equation: EquationId; value: number } | { equation: EquationId; refused: string };

export interface Spread {
  entries: SpreadEntry[];
  /** Lowest and highest of the values found; absent when every equation refused. */
  low?: number;
  high?: number;
}

/**
 * One quantity under several equations of state: how far they disagree is the least that can be said of its accuracy. An equation
 * that cannot do the fluid or the state is listed with its reason; it never counts as agreement.
 */
export function spread(fluid: FluidSpec, equations: readonly EquationId[], quantity: (model: FluidModel) => number): Spread {
  const entries = equations.map((equation): SpreadEntry => {
    try {
      return { equation, value: quantity(createFluidModel(byEquation(fluid, equation))) };
    } catch (error) {
      if (error instanceof EngineError) return { equation, refused: error.message };
      throw error;
    }
  });
  const values = entries.flatMap((entry) => ("value" in entry ? [entry.value] : []));
  return values.length === 0 ? { entries } : { entries, low: Math.min(...values), high: Math.max(...values) };
}

/**
 * The same fluid by another equation. Interaction lists are fitted to one equation: each other one takes its own published set. A volume
 * translation goes along only to equations that have one.
 */
export function byEquation(fluid: FluidSpec, equation: EquationId): FluidSpec {
  const { volumeTranslation, ...rest } = fluid;
  const interaction = equation === fluid.equation ? fluid.interaction : fluid.interaction === "none" ? "none" : "library";
  const translated =
    volumeTranslation && equation in cubicEquations && cubic[equation as CubicEquationId].interaction
      ? { volumeTranslation }
      : {};
  return { ...rest, ...translated, equation, interaction };
}
