import type { Warning } from "../cases/warning";
import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "../flash/equilibrium";
import { airMolarMass, hydrateFlagTemperature } from "./hydrate";
import { carbonDioxideTriple, solidCarbonDioxideFugacity } from "./solid-lines";

/** What may freeze out of an equilibrium: solid carbon dioxide, ice, hydrate, or a component below its triple point. Screening only. */
export function solidWarnings(model: FluidModel, state: Equilibrium): Warning[] {
  const T = state.temperatureK;
  const warnings: Warning[] = [];
  const share = (id: string) => {
    const index = model.componentIds.indexOf(id);
    return index >= 0 && model.feed[index]! > 0 ? index : -1;
  };

  const carbonDioxide = share("carbon_dioxide");
  if (
    carbonDioxide >= 0 &&
    T < carbonDioxideTriple.temperatureK &&
    T >= 150 &&
    carbonDioxideFreezes(model, state, carbonDioxide)
  ) {
    warnings.push({
      code: "solid-carbon-dioxide",
      message: `Solid carbon dioxide can form at ${T.toFixed(1)} K: its fugacity in the fluid is above that of the solid.`,
    });
  }

  if (share("water") >= 0) {
    if (T < 273.15) {
      warnings.push({
        code: "ice",
        message: `Water is present and ${T.toFixed(1)} K is below 273.15 K: ice may form and block.`,
      });
    }
    const gravity = model.mixtureMolarMass(model.feed) / airMolarMass;
    if (gravity >= 0.55 && gravity <= 1 && state.pressurePa > 3e5 && T <= hydrateFlagTemperature(state.pressurePa, gravity)) {
      warnings.push({
        code: "hydrate",
        message: `Water is present and ${T.toFixed(1)} K is within 3 K of, or below, the hydrate temperature of a sweet gas of gravity ${gravity.toFixed(2)} at this pressure.`,
      });
    }
  }

  model.substances.forEach(({ id, triplePointK }, i) => {
    if (id === "water" || id === "carbon_dioxide" || triplePointK === undefined) return;
    if (model.feed[i]! > 0.5 && T < triplePointK) {
      warnings.push({
        code: "below-triple-point",
        message: `${id}, the main component, is below its triple point (${triplePointK.toFixed(1)} K): the fluid would be solid.`,
      });
    }
  });
  return warnings;
}

function carbonDioxideFreezes(model: FluidModel, state: Equilibrium, index: number): boolean {
  const { temperatureK, pressurePa, phases } = state;
  const [phase] = phases; // at equilibrium the fugacity is the same in both
  const fugacity = phase!.composition[index]! * Math.exp(phase!.lnFugacityCoefficients[index]!) * pressurePa;
  const pure = Float64Array.from(model.feed, (_, i) => (i === index ? 1 : 0));
  const lnPhi = new Float64Array(pure.length);
  const saturatedVapour = (p: number) => Math.exp(model.lnFugacityCoefficients(temperatureK, p, pure, "vapour", lnPhi)[index]!);
  return fugacity > solidCarbonDioxideFugacity(temperatureK, pressurePa, saturatedVapour);
}
