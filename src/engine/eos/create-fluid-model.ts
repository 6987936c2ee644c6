import type { FluidSpec } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import { expandPlusFractions } from "../substances/plus-fraction";
import { resolveComponent } from "../substances/resolve-component";
import type { FluidModel } from "./fluid-model";
import { equations } from "./registry";

const maximumComponents = 25;

/**
 * The fluid of a case document as a model: library ids, pseudo-components and custom constants resolved, interaction
 * parameters looked up. Throws EngineError "invalid-case" with the path of the field, or "not-applicable".
 */
export function createFluidModel(given: FluidSpec): FluidModel {
  const fluid = expandPlusFractions(given);
  const entry = equations[fluid.equation];
  if (!entry) {
    throw new EngineError("not-applicable", `the equation "${fluid.equation}" is not available`, {}, "fluid.equation");
  }
  const feed = checkedFeed(fluid);
  return entry.build(fluid, fluid.components.map(resolveComponent), feed);
}

/** Mole fractions, divided by a sum that must be 1 within 1e-6. */
function checkedFeed({ components }: FluidSpec): Float64Array {
  if (components.length < 1 || components.length > maximumComponents) {
    throw new EngineError(
      "invalid-case",
      `a fluid needs 1 to ${maximumComponents} components`,
      { components: components.length },
      "fluid.components",
    );
  }
  const seen = new Set<string>();
  let sum = 0;
  components.forEach(({ id, moleFraction }, index) => {
    const path = `fluid.components[${index}]`;
    if (seen.has(id))
      throw new EngineError("invalid-case", `"${id}" is listed twice; add its fractions together`, {}, `${path}.id`);
    seen.add(id);
    if (!(moleFraction >= 0 && moleFraction <= 1)) {
      throw new EngineError("invalid-case", "a mole fraction must lie between 0 and 1", {}, `${path}.moleFraction`);
    }
    sum += moleFraction;
  });
  if (Math.abs(sum - 1) > 1e-6) {
    throw new EngineError("invalid-case", `the mole fractions add up to ${sum}, not to 1`, { sum }, "fluid.components");
  }
  return Float64Array.from(components, ({ moleFraction }) => moleFraction / sum);
}
