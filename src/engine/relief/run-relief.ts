/** A relief scenario from case to result: relieving pressure, stream, areas, standard orifice, its capacity and what it is held against. */
import type { Verdict } from "../cases/blowdown-result";
import type { ReliefCase, ReliefLimit, ReliefResult } from "../cases/relief-case";
import type { Warning } from "../cases/warning";
import { reliefCaution, screeningCaution } from "../cautions";
import { createFluidModel } from "../eos/create-fluid-model";
import type { FluidModel } from "../eos/fluid-model";
import { stateWarnings } from "../eos/state-warnings";
import { EngineError } from "../errors";
import { phaseWarnings } from "../flash/phase-warnings";
import { gasBackPressureFactor, highestBackPressureFraction, liquidBackPressureFactor } from "./back-pressure-factors";
import { chooseOrifices, standardOrifices } from "./orifices";
import { accumulatedPressureGaugePa, additionalSetGaugePa, type ReliefOccasion } from "./pressures";
import type { ReliefStream } from "./relief-stream";
import { streamOf } from "./scenarios/stream-of";
import { sizeStream, type SizedStream } from "./size-stream";

const atmospherePa = 101_325;
/** Part of the set pressure that the inlet may lose at rated flow (API Std 520-2). */
const inletShare = 0.03;
/** Area in hand that a screening asks for (policy, ours). */
const nearShare = 0.1;

export function runRelief(
  given: ReliefCase,
): Omit<ReliefResult, "engineVersion" | "caseSha256" | "numerics"> & { numerics: object } {
  const { device, backPressurePa } = given;
  const fluid = createFluidModel(given.fluid);
  const occasion = occasionOf(given);
  const mawp = device.workingPressureGaugePa ?? device.setPressureGaugePa;
  const accumulated = accumulatedPressureGaugePa(mawp, occasion);
  const relievingPressurePa = accumulated + atmospherePa;
  if (backPressurePa >= relievingPressurePa) {
    throw new EngineError(
      "invalid-case",
      `The back pressure must be below the relieving pressure, ${Math.round(relievingPressurePa)} Pa.`,
      {},
      "backPressurePa",
    );
  }
  const stream = streamOf(given.relief, { fluid, relievingPressurePa });
  const backFraction = (backPressurePa - atmospherePa) / device.setPressureGaugePa;
  const overpressure = occasion === "fire" ? "21" : occasion === "several-devices" ? "16" : "10";
  const balanced = device.type === "balanced";
  const factors = {
    combinationFactor: device.ruptureDisk ? 0.9 : 1,
    gasFactor: balanced ? gasBackPressureFactor(backFraction, overpressure) : 1,
    liquidFactor: balanced ? liquidBackPressureFactor(backFraction) : 1,
  };
  const sized = sizeStream(fluid, stream, { backPressurePa, device, factors });
  const governing = sized.areas.find(({ governs }) => governs) ?? sized.areas[0]!;
  const { requiredAreaM2 } = governing;
  const each = requiredAreaM2 / device.count;
  const chosen = device.orifice
    ? { letter: device.orifice, areaM2: areaOf(device.orifice), devices: device.count }
    : { ...chooseOrifices(each), devices: chooseOrifices(each).devices * device.count };
  const totalM2 = chosen.areaM2 * chosen.devices;
  const ratedMassFlowKgPerS = stream.massFlowKgPerS * (totalM2 / requiredAreaM2);
  const inletLossPa = given.inlet && inletLoss(given.inlet, ratedMassFlowKgPerS / chosen.devices, stream);
  const limits = limitsOf(given, { mawp, occasion, requiredAreaM2, totalM2, inletLossPa });
  return {
    format: "ebbmark-result/1",
    kind: "relief",
    scenario: given.relief.scenario,
    massFlowKgPerS: stream.massFlowKgPerS,
    basis: stream.basis,
    ...(stream.heatW === undefined ? {} : { heatW: stream.heatW }),
    ...(stream.latentHeatJPerKg === undefined ? {} : { latentHeatJPerKg: stream.latentHeatJPerKg }),
    relieving: relievingOf(fluid, stream, sized, accumulated),
    sizing: sized.areas,
    requiredAreaM2,
    designation: chosen.letter,
    orificeAreaM2: chosen.areaM2,
    devices: chosen.devices,
    ratedMassFlowKgPerS,
    backPressureFactor: sized.heatCapacityRatio === undefined ? factors.liquidFactor : factors.gasFactor,
    ...(inletLossPa === undefined ? {} : { inletLossPa }),
    verdict: worst(limits),
    limits,
    warnings: warningsOf(fluid, stream, sized, { balanced, backFraction }),
    cautions: [
      screeningCaution.words,
      reliefCaution,
      ...(occasion === "fire"
        ? [
            "The fire is an open pool of hydrocarbon-like fuel by the standard named. A jet fire on bare steel can weaken a wall faster than any relief device lowers its stress.",
          ]
        : []),
    ],
    numerics: {},
  };
}

const occasionOf = ({ relief, device }: ReliefCase): ReliefOccasion => {
  if (relief.scenario === "fire-wetted" || relief.scenario === "fire-unwetted") return "fire";
  return device.count > 1 ? "several-devices" : "one-device";
};

const areaOf = (letter: string): number => standardOrifices.find((one) => one.letter === letter)?.areaM2 ?? 0;

/** Non-recoverable loss K ρ w²/2 at the inlet, for one device. */
function inletLoss(
  { diameterM, resistanceCoefficient }: NonNullable<ReliefCase["inlet"]>,
  massFlowKgPerS: number,
  { state }: ReliefStream,
): number {
  const density = densityOf(state);
  const velocity = massFlowKgPerS / (density * (Math.PI / 4) * diameterM ** 2);
  return (resistanceCoefficient * density * velocity ** 2) / 2;
}

const densityOf = ({ molarVolumeM3PerMol, phases }: ReliefStream["state"]): number =>
  phases.reduce((sum, { moleFraction, state }) => sum + moleFraction * state.densityKgPerM3 * state.molarVolumeM3PerMol, 0) /
  molarVolumeM3PerMol;

function relievingOf(
  fluid: FluidModel,
  { state, composition }: ReliefStream,
  { heatCapacityRatio, saturationPressurePa }: SizedStream,
  accumulatedPressureGaugePa: number,
): ReliefResult["relieving"] {
  const filled = state.phases.filter(({ moleFraction }) => moleFraction > 1e-9);
  const mass = (kind: "liquid" | "other") =>
    filled.reduce(
      (sum, phase) =>
        (phase.kind === "liquid") === (kind === "liquid")
          ? sum + phase.moleFraction * fluid.mixtureMolarMass(phase.composition)
          : sum,
      0,
    );
  const one = filled.length === 1 ? filled[0] : undefined;
  return {
    pressurePa: state.pressurePa,
    accumulatedPressureGaugePa,
    temperatureK: state.temperatureK,
    phase: one ? (one.kind === "liquid" ? "liquid" : "vapour") : "two-phase",
    vapourMassFraction: mass("other") / (mass("other") + mass("liquid")),
    densityKgPerM3: densityOf(state),
    molarMassKgPerMol: fluid.mixtureMolarMass(composition),
    ...(one ? { compressibility: one.state.compressibility } : {}),
    ...(heatCapacityRatio === undefined ? {} : { heatCapacityRatio }),
    ...(saturationPressurePa === undefined ? {} : { saturationPressurePa }),
  };
}

type Held = {
  mawp: number;
  occasion: ReliefOccasion;
  requiredAreaM2: number;
  totalM2: number;
  inletLossPa: number | undefined;
};

function limitsOf({ device, superimposedPa, backPressurePa, inlet }: ReliefCase, held: Held): ReliefLimit[] {
  const { mawp, occasion, requiredAreaM2, totalM2, inletLossPa } = held;
  const builtUpPa = backPressurePa - superimposedPa;
  const overpressure = accumulatedPressureGaugePa(mawp, occasion) - device.setPressureGaugePa;
  // Conventional: built-up at most the overpressure. Balanced: half the set pressure. Pilot: decided by flow.
  const backLimit =
    device.type === "conventional"
      ? overpressure
      : device.type === "balanced"
        ? highestBackPressureFraction * device.setPressureGaugePa
        : undefined;
  const backValue = device.type === "balanced" ? backPressurePa - atmospherePa : builtUpPa;
  const set = device.count > 1 ? additionalSetGaugePa(mawp, occasion) : mawp;
  return withGoverning([
    line("relief-area", "Required area against the chosen orifice", requiredAreaM2, totalM2, "m²"),
    line("back-pressure", backPressureTitle[device.type], backValue, backLimit, "Pa"),
    line(
      "inlet-loss",
      "Loss of the inlet line at rated flow against 3 % of set",
      inletLossPa,
      inlet && inletShare * device.setPressureGaugePa,
      "Pa",
    ),
    // At its limit a set pressure is right, not beyond.
    {
      ...line("set-pressure", "Set pressure against the highest allowed", device.setPressureGaugePa, set, "Pa"),
      ...setVerdict(device.setPressureGaugePa, set),
    },
  ]);
}

const backPressureTitle = {
  conventional: "Built-up back pressure against the overpressure",
  balanced: "Total back pressure against half the set pressure",
  pilot: "Back pressure (a pilot-operated device is limited by its flow)",
} as const;

const setVerdict = (value: number, limit: number): { verdict: Verdict } => ({
  verdict: value <= limit * (1 + 1e-12) ? "within" : "beyond",
});

function line(
  id: ReliefLimit["id"],
  title: string,
  value: number | undefined,
  limit: number | undefined,
  unit: "m²" | "Pa",
): ReliefLimit {
  const head = { id, title, unit, sense: "at-most" as const, governs: false };
  if (value === undefined || limit === undefined) return { ...head, ...(value === undefined ? {} : { value }), verdict: "open" };
  const inHand = limit - value;
  const verdict: Verdict = inHand < 0 ? "beyond" : inHand < nearShare * limit ? "near" : "within";
  return { ...head, value, limit, inHand, ...(limit === 0 ? {} : { share: value / limit }), verdict };
}

function withGoverning(limits: ReliefLimit[]): ReliefLimit[] {
  const judged = limits.filter(({ id, share }) => share !== undefined && id !== "set-pressure");
  const worstShare = Math.max(...judged.map(({ share }) => share ?? 0));
  const governing = judged.find(({ share }) => share === worstShare);
  return limits.map((limit) => ({ ...limit, governs: limit === governing }));
}

/** The area is what a screening is for; the other lines may be open. */
function worst(limits: readonly ReliefLimit[]): Verdict {
  const verdicts = limits.map(({ verdict }) => verdict);
  if (verdicts.includes("beyond")) return "beyond";
  return verdicts.includes("near") ? "near" : "within";
}

function warningsOf(
  fluid: FluidModel,
  { state, warnings }: ReliefStream,
  { areas }: SizedStream,
  { balanced, backFraction }: { balanced: boolean; backFraction: number },
): Warning[] {
  const [first, second] = areas;
  const apart = first && second ? second.requiredAreaM2 / first.requiredAreaM2 - 1 : 0;
  return [
    ...warnings.map((message) => ({ code: "relief", message })),
    ...(Math.abs(apart) > 0.1 && first && second
      ? [
          {
            code: "methods-apart",
            message: `"${second.title}" asks for ${Math.round(apart * 100)} % ${apart > 0 ? "more" : "less"} area than "${first.title}", which counts.`,
          },
        ]
      : []),
    ...(balanced && backFraction > highestBackPressureFraction
      ? [
          {
            code: "outside-curve",
            message: "The back pressure is above half the set pressure, where the curves of balanced devices end.",
          },
        ]
      : []),
    ...phaseWarnings(fluid, state),
    ...stateWarnings(fluid, [state.temperatureK]),
  ];
}
