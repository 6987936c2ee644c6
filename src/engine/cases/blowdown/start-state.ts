/** The contents at the start: amounts and energy in the given volume, before or after settling and coming to rest. */
import { createFluidModel } from "../../eos/create-fluid-model";
import type { FluidModel } from "../../eos/fluid-model";
import { EngineError } from "../../errors";
import type { Equilibrium } from "../../flash/equilibrium";
import { filledState } from "../../start/filled-state";
import { flashTV } from "../../start/flash-tv";
import { fillParts, settle, type Settled } from "../../start/settle-out";
import type { BlowdownCase } from "../blowdown-case";
import type { FluidSpec } from "../fluid-spec";

export type StartState = {
  temperatureK: number;
  pressurePa: number;
  molesMol: Float64Array;
  totalMolesMol: number;
  internalEnergyJ: number;
  twoPhase: boolean;
};

export type Start = {
  /** With the composition of the whole section as its feed. */
  fluid: FluidModel;
  spec: FluidSpec;
  start: StartState;
  settled: Settled | undefined;
};

type StartCase = Pick<BlowdownCase, "fluid" | "start" | "vessels">;

export function startOf(blowdown: StartCase, volumeM3: number): Start {
  const { start } = blowdown;
  const given = createFluidModel(blowdown.fluid);
  if (!("settleOut" in start)) {
    const found = atRest(given, filledState(given, start, "start"), start.restAtTemperatureK);
    return { fluid: given, spec: blowdown.fluid, start: filling(given, found, volumeM3), settled: undefined };
  }
  const settled = settle(given, fillParts(given, partsOf(blowdown)), start.settleOut);
  const { spec, fluid } = withFeed(blowdown.fluid, given, settled.composition);
  const found = atRest(fluid, settled.after, start.restAtTemperatureK);
  return { fluid, spec, start: filling(fluid, found, volumeM3), settled };
}

function partsOf({ vessels }: StartCase): NonNullable<BlowdownCase["vessels"]> {
  if (vessels && vessels.length > 0) return vessels;
  throw new EngineError("invalid-case", "There is nothing to settle out. List the vessels that are joined.", {}, "vessels");
}

/** Closed in at constant volume until everything has the temperature. */
function atRest(fluid: FluidModel, before: Equilibrium, temperatureK: number | undefined): Equilibrium {
  if (temperatureK === undefined) return before;
  return flashTV(fluid, { temperatureK, molarVolumeM3PerMol: before.molarVolumeM3PerMol }, fluid.feed);
}

function filling(fluid: FluidModel, found: Equilibrium, volumeM3: number): StartState {
  const total = volumeM3 / found.molarVolumeM3PerMol;
  return {
    temperatureK: found.temperatureK,
    pressurePa: found.pressurePa,
    molesMol: fluid.feed.map((z) => z * total),
    totalMolesMol: total,
    internalEnergyJ: total * found.internalEnergyJPerMol,
    twoPhase: found.phases.length > 1,
  };
}

/** The same fluid with another composition, where it is another. */
function withFeed(spec: FluidSpec, given: FluidModel, z: Float64Array): { spec: FluidSpec; fluid: FluidModel } {
  if (z.every((fraction, i) => Math.abs(fraction - (given.feed[i] ?? 0)) < 1e-14)) return { spec, fluid: given };
  const mixed = { ...spec, components: spec.components.map((one, i) => ({ ...one, moleFraction: z[i] ?? 0 })) };
  return { spec: mixed, fluid: createFluidModel(mixed) };
}
