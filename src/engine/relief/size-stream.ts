/**
 * Areas that pass a stream, by every published way that fits its phase: the one from the equation of state first, which counts, then the sizing
 * equations beside it.
 */
import type { ReliefDevice, SizedArea } from "../cases/relief-case";
import type { FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { flashPS } from "../flash/flash-ph";
import { flashTQ } from "../flash/flash-quality";
import { equilibriumNozzle } from "../flow/equilibrium-nozzle";
import { frozenNozzle } from "../flow/frozen-nozzle";
import { criticalPressureRatio, gasCriticalAreaM2, gasSubcriticalAreaM2 } from "./gas-sizing";
import { liquidAreaM2 } from "./liquid-sizing";
import { omegaOfMixture, omegaSubcooledFlux, omegaTwoPhaseFlux } from "./omega";
import type { ReliefStream } from "./relief-stream";
import { highestSteamPressurePa, steamAreaM2 } from "./steam-sizing";

export type Factors = { combinationFactor: number; gasFactor: number; liquidFactor: number };
export type SizingSite = { backPressurePa: number; device: ReliefDevice; factors: Factors };

/** Effective coefficients before a device is chosen (API Std 520-1). */
const coefficients = { gas: 0.975, twoPhase: 0.85, liquid: 0.65 } as const;

export type SizedStream = {
  areas: SizedArea[];
  heatCapacityRatio?: number;
  saturationPressurePa?: number;
};

export function sizeStream(fluid: FluidModel, stream: ReliefStream, site: SizingSite): SizedStream {
  const filled = stream.state.phases.filter(({ moleFraction }) => moleFraction > 1e-9);
  if (filled.length > 1) return twoPhase(fluid, stream, site);
  return filled[0]?.kind === "liquid" ? liquid(fluid, stream, site) : gas(fluid, stream, site);
}

const areaFor = (massFlow: number, flux: number, coefficient: number, factor: number, { combinationFactor }: Factors): number =>
  massFlow / (coefficient * factor * combinationFactor * flux);

function gas(fluid: FluidModel, { massFlowKgPerS, state, composition }: ReliefStream, site: SizingSite): SizedStream {
  const { backPressurePa, factors, device } = site;
  const one = state.phases.find(({ moleFraction }) => moleFraction > 0.5)!;
  const { temperatureK, pressurePa } = state;
  const cp = fluid.idealGas(temperatureK, pressurePa, composition).heatCapacityPJPerMolK;
  const heatCapacityRatio = cp / (cp - fluid.gasConstantJPerMolK);
  const real = frozenNozzle(fluid, one.state, composition, backPressurePa);
  const equation = {
    massFlowKgPerS,
    molarMassKgPerMol: fluid.mixtureMolarMass(composition),
    temperatureK,
    heatCapacityRatio,
    relievingPressurePa: pressurePa,
    dischargeCoefficient: coefficients.gas,
    combinationFactor: factors.combinationFactor,
    backPressureFactor: factors.gasFactor,
    backPressurePa,
  };
  const choked = backPressurePa <= criticalPressureRatio(heatCapacityRatio) * pressurePa;
  // A balanced device has its factor for back pressure and is computed as if it choked (API Std 520-1).
  const critical = choked || device.type === "balanced";
  const byEquation = (compressibility: number): number =>
    critical ? gasCriticalAreaM2({ ...equation, compressibility }) : gasSubcriticalAreaM2({ ...equation, compressibility });
  const Z = one.state.compressibility;
  const areas: SizedArea[] = [
    {
      method: "real-gas-isentropic",
      title: "Isentropic flow of the real gas",
      requiredAreaM2: areaFor(massFlowKgPerS, real.massFluxKgPerM2S, coefficients.gas, factors.gasFactor, factors),
      massFluxKgPerM2S: real.massFluxKgPerM2S,
      dischargeCoefficient: coefficients.gas,
      governs: true,
    },
    {
      method: critical ? "api-gas-critical" : "api-gas-subcritical",
      title: `Sizing equation of API Std 520-1, ${critical ? "choked" : "not choked"}, with the real Z`,
      requiredAreaM2: byEquation(Z),
      dischargeCoefficient: coefficients.gas,
      governs: false,
      ...(Z < 0.8 || Z > 1.1
        ? { note: `Z is ${Z.toFixed(3)}, outside 0.8 to 1.1: the ideal heat capacity ratio no longer stands for the gas.` }
        : {}),
    },
    {
      method: "api-gas-ideal",
      title: "The same as an ideal gas, for comparison",
      requiredAreaM2: byEquation(1),
      dischargeCoefficient: coefficients.gas,
      governs: false,
    },
  ];
  if (isWater(fluid, composition) && pressurePa <= highestSteamPressurePa) {
    areas.push({
      method: "api-steam",
      title: "Steam by Napier's equation, superheat not credited",
      requiredAreaM2: steamAreaM2({
        ...equation,
        superheatFactor: 1,
      }),
      dischargeCoefficient: coefficients.gas,
      governs: false,
    });
  }
  return { areas, heatCapacityRatio };
}

function liquid(fluid: FluidModel, { massFlowKgPerS, state, composition }: ReliefStream, site: SizingSite): SizedStream {
  const { backPressurePa, factors } = site;
  const one = state.phases.find(({ moleFraction }) => moleFraction > 0.5)!;
  const { temperatureK, pressurePa } = state;
  const saturationPressurePa = bubblePressure(fluid, temperatureK, composition);
  const flashes = saturationPressurePa !== undefined && saturationPressurePa > backPressurePa;
  const equation: SizedArea = {
    method: "api-liquid",
    title: "Liquid by API Std 520-1, certified device",
    requiredAreaM2: liquidAreaM2({
      massFlowKgPerS,
      densityKgPerM3: one.state.densityKgPerM3,
      relievingPressurePa: pressurePa,
      backPressurePa: Math.max(backPressurePa, 0),
      dischargeCoefficient: coefficients.liquid,
      backPressureFactor: factors.liquidFactor,
      combinationFactor: factors.combinationFactor,
      viscosityFactor: 1,
    }),
    dischargeCoefficient: coefficients.liquid,
    governs: !flashes,
    note: flashes ? "The liquid flashes in the nozzle, which this equation leaves out." : "Viscosity is not corrected for.",
  };
  if (!flashes) return { areas: [equation], ...(saturationPressurePa === undefined ? {} : { saturationPressurePa }) };
  const direct = equilibriumNozzle(fluid, state, composition, backPressurePa);
  const areas: SizedArea[] = [
    {
      method: "equilibrium-isentropic",
      title: "Isentropic flow in equilibrium, flashing in the nozzle",
      requiredAreaM2: areaFor(massFlowKgPerS, direct.massFluxKgPerM2S, coefficients.liquid, factors.liquidFactor, factors),
      massFluxKgPerM2S: direct.massFluxKgPerM2S,
      dischargeCoefficient: coefficients.liquid,
      governs: true,
    },
    equation,
  ];
  const nine = flashPS(fluid, { pressurePa: 0.9 * saturationPressurePa, entropyJPerMolK: state.entropyJPerMolK }, composition);
  const omega = omegaOfMixture(nine.molarVolumeM3PerMol, one.state.molarVolumeM3PerMol);
  if (omega > 0 && saturationPressurePa < pressurePa) {
    const flow = omegaSubcooledFlux({
      omega,
      pressurePa,
      saturationPressurePa,
      densityKgPerM3: one.state.densityKgPerM3,
      backPressurePa,
    });
    areas.push({
      method: "omega-subcooled",
      title: `Omega method, ${flow.subcooling} subcooling`,
      requiredAreaM2: areaFor(massFlowKgPerS, flow.massFluxKgPerM2S, coefficients.liquid, factors.liquidFactor, factors),
      massFluxKgPerM2S: flow.massFluxKgPerM2S,
      dischargeCoefficient: coefficients.liquid,
      governs: false,
      note: `ω ${omega.toPrecision(4)}`,
    });
  }
  return { areas, saturationPressurePa };
}

function twoPhase(fluid: FluidModel, { massFlowKgPerS, state, composition }: ReliefStream, site: SizingSite): SizedStream {
  const { backPressurePa, factors } = site;
  const direct = equilibriumNozzle(fluid, state, composition, backPressurePa);
  const nine = flashPS(fluid, { pressurePa: 0.9 * state.pressurePa, entropyJPerMolK: state.entropyJPerMolK }, composition);
  const omega = omegaOfMixture(nine.molarVolumeM3PerMol, state.molarVolumeM3PerMol);
  const flow = omegaTwoPhaseFlux({
    omega,
    pressurePa: state.pressurePa,
    specificVolumeM3PerKg: state.molarVolumeM3PerMol / fluid.mixtureMolarMass(composition),
    backPressurePa,
  });
  const area = (flux: number) => areaFor(massFlowKgPerS, flux, coefficients.twoPhase, factors.gasFactor, factors);
  return {
    areas: [
      {
        method: "equilibrium-isentropic",
        title: "Isentropic flow in equilibrium, two phases at the inlet",
        requiredAreaM2: area(direct.massFluxKgPerM2S),
        massFluxKgPerM2S: direct.massFluxKgPerM2S,
        dischargeCoefficient: coefficients.twoPhase,
        governs: true,
      },
      {
        method: "omega-two-phase",
        title: "Omega method",
        requiredAreaM2: area(flow.massFluxKgPerM2S),
        massFluxKgPerM2S: flow.massFluxKgPerM2S,
        dischargeCoefficient: coefficients.twoPhase,
        governs: false,
        note: `ω ${omega.toPrecision(4)}`,
      },
    ],
  };
}

/** Undefined above the critical region, where nothing boils. */
function bubblePressure(fluid: FluidModel, temperatureK: number, composition: ArrayLike<number>): number | undefined {
  try {
    return flashTQ(fluid, { temperatureK, vapourMoleFraction: 0 }, composition).pressurePa;
  } catch (error) {
    if (error instanceof EngineError) return undefined;
    throw error;
  }
}

const isWater = (fluid: FluidModel, composition: ArrayLike<number>): boolean =>
  fluid.componentIds.every((id, i) => (id === "water" ? (composition[i] ?? 0) > 0.999 : (composition[i] ?? 0) < 1e-3));
