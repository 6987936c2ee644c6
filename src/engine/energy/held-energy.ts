/** What a vessel's contents can release: six published definitions side by side, and how far the blast of one of them reaches. */
import type { EnergyCase, EnergyDefinition, EnergyResult, HeldEnergy, StandOff } from "../cases/energy-case";
import { fragmentCaution, screeningCaution, standOffCaution } from "../cautions";
import { createFluidModel } from "../eos/create-fluid-model";
import type { FluidModel } from "../eos/fluid-model";
import { stateWarnings } from "../eos/state-warnings";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { flashPS } from "../flash/flash-ph";
import { phaseWarnings } from "../flash/phase-warnings";
import { solidWarnings } from "../solids/solid-warnings";
import { filledState } from "../start/filled-state";
import { measureVessel } from "../vessel/geometry";
import { effectOf } from "./blast-effects";
import { freeAirScaledDistance, surfaceScaledDistance } from "./blast";
import { fixedDistanceM, pressureTestEnergyJ, testDistanceM, tntJPerKg } from "./pressure-test";
import { availabilityEnergyJ, brodeEnergyJ, isentropicEnergyJ, isothermalEnergyJ, type GasVessel } from "./stored-energy";

const words: Record<EnergyDefinition, { title: string; use: string }> = {
  brode: {
    title: "Heat added at constant volume (Brode)",
    use: "Near field of a vessel burst; an upper value. Ideal gas, vapour space only.",
  },
  "isentropic-ideal": {
    title: "Isentropic expansion of an ideal gas (Baker)",
    use: "Vessel burst, usual choice for a gas. Ideal gas, vapour space only.",
  },
  isothermal: {
    title: "Isothermal expansion (Smith and Van Ness)",
    use: "Upper bound where heat can follow; overstates a sudden burst. Ideal gas, vapour space only.",
  },
  availability: {
    title: "Thermodynamic availability (Crowl)",
    use: "Most work that the surroundings allow. Ideal gas, vapour space only.",
  },
  "isentropic-real": {
    title: "Isentropic expansion of the real fluid, flashing liquid included",
    use: "Vessel burst with liquid or dense gas: all contents, by the equation of state.",
  },
  "isentropic-real-less-atmosphere": {
    title: "The same less the work done on the atmosphere",
    use: "Shock energy alone.",
  },
};

/** The ground reflects a burst: the free-air curve takes 1.8 times the charge (range 1.7 to 2). */
const groundFactor = 1.8;

/** Throws EngineError "invalid-case" where the contents are not above their surroundings; what the flashes throw. */
export function runEnergy(
  given: EnergyCase,
): Omit<EnergyResult, "engineVersion" | "caseSha256" | "numerics"> & { numerics: object } {
  const fluid = createFluidModel(given.fluid);
  const found = filledState(fluid, given.start, "start");
  const { surroundingsPa } = given;
  if (found.pressurePa <= surroundingsPa) {
    throw new EngineError(
      "invalid-case",
      `The contents are at ${Math.round(found.pressurePa)} Pa, not above their surroundings at ${surroundingsPa} Pa: they can release nothing by expanding.`,
      {},
      "start",
    );
  }
  const { volumeM3 } = measureVessel(given.vessel.geometry);
  const molarMass = fluid.mixtureMolarMass(fluid.feed);
  const massKg = (volumeM3 / found.molarVolumeM3PerMol) * molarMass;
  const vapour = vapourOf(fluid, found, volumeM3);
  const end = flashPS(fluid, { pressurePa: surroundingsPa, entropyJPerMolK: found.entropyJPerMolK });
  const workJPerKg = (found.internalEnergyJPerMol - end.internalEnergyJPerMol) / molarMass;
  const atmosphereJPerKg = (surroundingsPa * (end.molarVolumeM3PerMol - found.molarVolumeM3PerMol)) / molarMass;

  const energies = energiesOf(given, {
    gas: vapour && { pressurePa: found.pressurePa, surroundingsPa, volumeM3: vapour.volumeM3, k: vapour.heatCapacityRatio },
    realJ: massKg * workJPerKg,
    shockJ: massKg * (workJPerKg - atmosphereJPerKg),
  });
  const basis = energies.find(({ definition }) => definition === given.standOffBy);
  if (!basis) {
    throw new EngineError(
      "not-applicable",
      `There is no vapour, and "${given.standOffBy}" counts vapour only. Use "isentropic-real".`,
      {},
      "standOffBy",
    );
  }
  return {
    format: "ebbmark-result/1",
    kind: "energy",
    held: {
      volumeM3,
      massKg,
      pressurePa: found.pressurePa,
      temperatureK: found.temperatureK,
      vapourMoleFraction: found.vapourMoleFraction,
      vapourVolumeM3: vapour?.volumeM3 ?? 0,
      ...(vapour ? { heatCapacityRatio: vapour.heatCapacityRatio } : {}),
    },
    energies,
    expanded: { temperatureK: end.temperatureK, vapourMoleFraction: end.vapourMoleFraction, workJPerKg, atmosphereJPerKg },
    standOff: given.overpressuresPa.map((overpressurePa) => standOffAt(overpressurePa, basis.tntKg)),
    ...(vapour ? { pressureTest: pressureTest(found.pressurePa, vapour.volumeM3) } : {}),
    warnings: [
      ...phaseWarnings(fluid, found),
      ...solidWarnings(fluid, end),
      ...stateWarnings(fluid, [found.temperatureK, end.temperatureK]),
    ],
    cautions: [
      screeningCaution.words,
      standOffCaution.words,
      fragmentCaution,
      "The energy is that of the stated volume alone: count the whole isolatable section at its highest credible pressure.",
    ],
    numerics: {},
  };
}

/** Volume and ideal-gas heat capacity ratio of the vapour; a supercritical fluid counts as gas. */
function vapourOf(
  fluid: FluidModel,
  found: Equilibrium,
  volumeM3: number,
): { volumeM3: number; heatCapacityRatio: number } | undefined {
  // At its bubble point a fluid has a vapour of no amount.
  const phase = found.phases.find(({ kind, moleFraction }) => kind !== "liquid" && moleFraction > 1e-9);
  if (!phase) return undefined;
  const share = (phase.moleFraction * phase.state.molarVolumeM3PerMol) / found.molarVolumeM3PerMol;
  const { heatCapacityPJPerMolK: cp } = fluid.idealGas(found.temperatureK, found.pressurePa, phase.composition);
  return { volumeM3: share * volumeM3, heatCapacityRatio: cp / (cp - fluid.gasConstantJPerMolK) };
}

type Sums = { gas: (GasVessel & { k: number }) | undefined; realJ: number; shockJ: number };

function energiesOf(given: EnergyCase, { gas, realJ, shockJ }: Sums): HeldEnergy[] {
  const ideal: [EnergyDefinition, number][] = gas
    ? [
        ["brode", brodeEnergyJ(gas, gas.k)],
        ["isentropic-ideal", isentropicEnergyJ(gas, gas.k)],
        ["isothermal", isothermalEnergyJ(gas)],
        ["availability", availabilityEnergyJ(gas)],
      ]
    : [];
  const all: [EnergyDefinition, number][] = [...ideal, ["isentropic-real", realJ], ["isentropic-real-less-atmosphere", shockJ]];
  return all.map(([definition, energyJ]) => ({
    definition,
    ...words[definition],
    energyJ,
    tntKg: (Math.max(energyJ, 0) * given.blastFraction) / given.tntEnergyJPerKg,
  }));
}

function standOffAt(overpressurePa: number, tntKg: number): StandOff {
  const scaledDistance = surfaceScaledDistance(overpressurePa);
  return {
    overpressurePa,
    effect: effectOf(overpressurePa),
    distanceM: scaledDistance * Math.cbrt(tntKg),
    distanceByFreeAirM: freeAirScaledDistance(overpressurePa) * Math.cbrt(groundFactor * tntKg),
    scaledDistance,
  };
}

function pressureTest(pressurePa: number, volumeM3: number) {
  const energyJ = pressureTestEnergyJ(pressurePa, volumeM3);
  const tntKg = energyJ / tntJPerKg;
  return { energyJ, tntKg, standOffM: Math.max(testDistanceM(tntKg, leastScaledDistance), fixedDistanceM(energyJ)) };
}
/** The article's least scaled distance [m/kg^(1/3)]. */
const leastScaledDistance = 20;
