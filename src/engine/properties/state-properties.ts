import type { StatePoint } from "../cases/path-case";
import type { Warning } from "../cases/warning";
import { jouleThomsonKPerPa, type FluidModel } from "../eos/fluid-model";
import { stateWarnings } from "../eos/state-warnings";
import type { Equilibrium, EquilibriumPhase, PhaseKind } from "../flash/equilibrium";
import { flashPT } from "../flash/flash-pt";
import { phaseWarnings } from "../flash/phase-warnings";
import { solidWarnings } from "../solids/solid-warnings";
import { transportProperties } from "../transport/transport-properties";
import { liquidSurfaceTension } from "./liquid-surface-tension";

/** One phase of a state, or the whole where nothing but sums can be said of it. */
export interface BulkProperties {
  molarMassKgPerMol: number;
  densityKgPerM3: number;
  molarVolumeM3PerMol: number;
  compressibility: number;
  internalEnergyJPerMol: number;
  enthalpyJPerMol: number;
  entropyJPerMolK: number;
}

export interface PhaseProperties extends BulkProperties {
  kind: PhaseKind;
  /** A liquid that is mostly water, beside other components. */
  aqueous: boolean;
  moleFraction: number;
  massFraction: number;
  heatCapacityVJPerMolK: number;
  heatCapacityPJPerMolK: number;
  heatCapacityRatio: number;
  soundSpeedMPerS: number;
  jouleThomsonKPerPa: number;
  viscosityPaS: number;
  conductivityWPerMK: number;
  prandtl: number;
  /** Of a liquid; left out where the correlation has no constants for most of it. */
  surfaceTensionNPerM?: number;
  /** In the order of the components. */
  composition: number[];
}

export interface StateProperties extends StatePoint {
  phase: PhaseKind | "two-phase";
  vapourMoleFraction: number;
  overall: BulkProperties;
  /** One, or up to three with the lightest first. */
  phases: PhaseProperties[];
  /** `ratio` of a mole fraction in the lightest phase to that in the next one, the liquid without the water where there is one. */
  components: { id: string; moleFraction: number; ratio?: number }[];
  warnings: Warning[];
}

/**
 * Everything that is known of a fluid at (T, p): its phases with caloric, volumetric and transport properties, and the ratios
 * K_i = y_i/x_i where there are several.
 *
 * Source   docs/methods/equations-of-state.md, docs/methods/transport-properties.md
 * Throws   EngineError
 */
export function stateProperties(model: FluidModel, point: StatePoint): StateProperties {
  return propertiesOf(model, flashPT(model, point));
}

/** As `stateProperties`, of an equilibrium that is known already. */
export function propertiesOf(model: FluidModel, state: Equilibrium): StateProperties {
  const { temperatureK, pressurePa, phase, vapourMoleFraction } = state;
  const molarMass = model.mixtureMolarMass(model.feed);
  const phases = state.phases.map((one) => phaseProperties(model, one, molarMass));
  const [lightest, ...others] = phases;
  const beside = others.find(({ aqueous }) => !aqueous) ?? others[0];
  return {
    temperatureK,
    pressurePa,
    phase,
    vapourMoleFraction,
    overall: {
      molarMassKgPerMol: molarMass,
      densityKgPerM3: molarMass / state.molarVolumeM3PerMol,
      molarVolumeM3PerMol: state.molarVolumeM3PerMol,
      compressibility: (pressurePa * state.molarVolumeM3PerMol) / (model.gasConstantJPerMolK * temperatureK),
      internalEnergyJPerMol: state.internalEnergyJPerMol,
      enthalpyJPerMol: state.enthalpyJPerMol,
      entropyJPerMolK: state.entropyJPerMolK,
    },
    phases,
    components: model.componentIds.map((id, i) => {
      const [y, x] = [lightest?.composition[i], beside?.composition[i]];
      const base = { id, moleFraction: model.feed[i]! };
      return y !== undefined && x !== undefined && x > 0 ? { ...base, ratio: y / x } : base;
    }),
    warnings: [...phaseWarnings(model, state), ...solidWarnings(model, state), ...stateWarnings(model, [temperatureK])],
  };
}

function phaseProperties(model: FluidModel, phase: EquilibriumPhase, overallMolarMass: number): PhaseProperties {
  const { kind, moleFraction, composition, state } = phase;
  const molarMass = model.mixtureMolarMass(composition);
  const water = model.componentIds.indexOf("water");
  const tension = kind === "liquid" ? liquidSurfaceTension(model, composition, state.temperatureK) : undefined;
  return {
    kind,
    aqueous: kind === "liquid" && model.componentIds.length > 1 && (composition[water] ?? 0) > 0.5,
    moleFraction,
    massFraction: (moleFraction * molarMass) / overallMolarMass,
    molarMassKgPerMol: molarMass,
    densityKgPerM3: state.densityKgPerM3,
    molarVolumeM3PerMol: state.molarVolumeM3PerMol,
    compressibility: state.compressibility,
    internalEnergyJPerMol: state.internalEnergyJPerMol,
    enthalpyJPerMol: state.enthalpyJPerMol,
    entropyJPerMolK: state.entropyJPerMolK,
    heatCapacityVJPerMolK: state.heatCapacityVJPerMolK,
    heatCapacityPJPerMolK: state.heatCapacityPJPerMolK,
    heatCapacityRatio: state.heatCapacityPJPerMolK / state.heatCapacityVJPerMolK,
    soundSpeedMPerS: state.soundSpeedMPerS,
    jouleThomsonKPerPa: jouleThomsonKPerPa(state),
    ...transportProperties(model, state, composition),
    ...(tension === undefined ? {} : { surfaceTensionNPerM: tension }),
    composition: [...composition],
  };
}
