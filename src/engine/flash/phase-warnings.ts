import type { Warning } from "../cases/warning";
import type { FluidModel } from "../eos/fluid-model";
import { waterSaturationPressure } from "../solids/solid-lines";
import { saturatedWaterDensity } from "../substances/liquid-water";
import { EngineError } from "../errors";
import type { Equilibrium, EquilibriumPhase } from "./equilibrium";
import { saturationAtTemperature } from "./saturation-pure";
import { verifyPhases } from "./verify-phases";

/** What has to be said about the phases of an equilibrium: liquid water and second liquids in it, and a phase that it leaves out. */
export function phaseWarnings(model: FluidModel, state: Equilibrium): Warning[] {
  const where = `at ${state.temperatureK.toFixed(2)} K and ${(state.pressurePa / 1e5).toFixed(3)} bar`;
  const warnings: Warning[] = [];
  const water = model.componentIds.indexOf("water");
  const wet = water >= 0 && model.feed[water]! > 0;
  const others = model.feed.some((fraction, i) => i !== water && fraction > 0);
  const aqueous = wet && others ? state.phases.filter((phase) => phase.kind === "liquid" && phase.composition[water]! > 0.5) : [];
  for (const phase of aqueous) warnings.push(freeWater(model, state, phase, water, where));
  const liquids = state.phases.filter((phase) => phase.kind === "liquid" && !aqueous.includes(phase));
  if (liquids.length > 1) {
    warnings.push({
      code: "two-liquids",
      message: `Two liquids ${state.phases.length > liquids.length + aqueous.length ? "and a vapour " : ""}stand side by side ${where}. Their split is computed, but the interaction parameters were fitted to vapour and one liquid: amounts and compositions of the two are uncertain.`,
    });
  }

  const verdict = state.missingPhase ? "third-phase" : verifyPhases(model, state);
  if (verdict !== "sound") {
    const missing = verdict === "third-phase" ? "A further phase" : "A second phase";
    warnings.push({
      code: wet && others ? "free-water" : verdict,
      message: `${missing}${wet && others ? " (with water in the feed: probably free water)" : ""} would form ${where} and is left out of this result.`,
    });
  }
  return warnings;
}

function freeWater(model: FluidModel, state: Equilibrium, phase: EquilibriumPhase, water: number, where: string): Warning {
  const share = (100 * phase.moleFraction * phase.composition[water]!) / model.feed[water]!;
  const volume = (100 * phase.moleFraction * phase.state.molarVolumeM3PerMol) / state.molarVolumeM3PerMol;
  const density = 100 * (phase.state.densityKgPerM3 / saturatedWaterDensity(state.temperatureK) - 1);
  const vapour = vapourPressureDeviation(model, state.temperatureK, water);
  const beside = state.phases.length === 3 ? "as a third phase" : "as a phase of its own";
  return {
    code: "free-water",
    message:
      `Liquid water stands ${beside} ${where}: ${percent(share)} of the water in the fluid, ${percent(100 * phase.moleFraction)} of all moles and ${percent(volume)} of the volume. ` +
      `It is computed by the same equation as the rest, whose density of water is ${signed(density)} off here` +
      (vapour === undefined
        ? ""
        : ` and whose vapour pressure of water is ${signed(vapour)} off, and the water content of the gas with it`) +
      ". What the water dissolves is understated; salt, inhibitors, ice and hydrate are left out.",
  };
}

/** Deviation of the equation's vapour pressure of pure water from that of Wagner and Pruss [%]; undefined where either has none. */
function vapourPressureDeviation(model: FluidModel, temperatureK: number, water: number): number | undefined {
  const T = Math.max(temperatureK, 273.16);
  const pure = Float64Array.from(model.feed, (_, i) => (i === water ? 1 : 0));
  try {
    return 100 * (saturationAtTemperature(model, T, pure).pressurePa / waterSaturationPressure(T) - 1);
  } catch (error) {
    if (error instanceof EngineError) return undefined;
    throw error;
  }
}

const percent = (value: number) => `${value >= 99.95 ? "100" : value.toPrecision(2)} %`;
const signed = (value: number) => `${value < 0 ? "−" : "+"}${Math.abs(value).toFixed(1)} %`;
