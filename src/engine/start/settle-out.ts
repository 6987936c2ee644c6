/**
 * Several closed volumes that are opened to each other and settle.
 *
 *   n_i = Σ_j n_ij,  V = Σ_j V_j,  Σ_j U_j + Σ_j E_wall,j = U(T, V, n) + E_wall(T)
 *
 * "adiabatic"   the steel keeps its heat: U, V and n fix temperature, pressure and phases
 * "with-steel"  fluid and steel come to one temperature
 * Holds    no work done on the gas (a compressor that runs down adds some), every listed volume takes part, no height
 * Checks   settle-out.test.ts (M2-07; energy to 1e-10)
 */
import { makeWall, type Wall } from "../cases/blowdown/wall";
import type { SectionPart, SettleOut } from "../cases/blowdown-case";
import type { FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { flashUV } from "../flash/flash-uv";
import { bracketedRoot } from "../ode/bracketed-root";
import { measureVessel } from "../vessel/geometry";
import { filledState } from "./filled-state";
import { flashTV } from "./flash-tv";

export type FilledPart = {
  name: string;
  volumeM3: number;
  pressurePa: number;
  temperatureK: number;
  molesMol: Float64Array;
  totalMolesMol: number;
  massKg: number;
  internalEnergyJ: number;
  steel: Wall | undefined;
  steelTemperatureK: number;
};

export type Settled = {
  parts: FilledPart[];
  volumeM3: number;
  composition: Float64Array;
  totalMolesMol: number;
  after: Equilibrium;
  /** Given up by the steel, positive into the fluid. */
  heatFromSteelJ: number;
  rule: SettleOut["settleOut"];
};

export function fillParts(fluid: FluidModel, parts: readonly SectionPart[]): FilledPart[] {
  return parts.map((part, i) => {
    const vessel = measureVessel(part.geometry);
    const z = compositionOf(fluid, part, i);
    const state = filledState(fluid, part.start, `vessels[${i}].start`, z);
    const totalMolesMol = vessel.volumeM3 / state.molarVolumeM3PerMol;
    const steelTemperatureK = part.wallTemperatureK ?? state.temperatureK;
    return {
      name: part.name ?? `Vessel ${i + 1}`,
      volumeM3: vessel.volumeM3,
      pressurePa: state.pressurePa,
      temperatureK: state.temperatureK,
      molesMol: z.map((fraction) => fraction * totalMolesMol),
      totalMolesMol,
      massKg: totalMolesMol * fluid.mixtureMolarMass(z),
      internalEnergyJ: totalMolesMol * state.internalEnergyJPerMol,
      steel: part.wall && makeWall("lumped", part.wall, vessel, steelTemperatureK),
      steelTemperatureK,
    };
  });
}

export function settle(fluid: FluidModel, parts: FilledPart[], rule: SettleOut["settleOut"]): Settled {
  const sum = (pick: (part: FilledPart) => number): number => parts.reduce((total, part) => total + pick(part), 0);
  const totalMolesMol = sum((part) => part.totalMolesMol);
  const volumeM3 = sum((part) => part.volumeM3);
  const energyJ = sum((part) => part.internalEnergyJ);
  const composition = Float64Array.from(fluid.feed, (_, i) => sum((part) => part.molesMol[i] ?? 0) / totalMolesMol);
  const molarVolumeM3PerMol = volumeM3 / totalMolesMol;
  const common = { parts, volumeM3, composition, totalMolesMol, rule };
  if (rule === "adiabatic") {
    const after = flashUV(fluid, { internalEnergyJPerMol: energyJ / totalMolesMol, molarVolumeM3PerMol }, composition);
    return { ...common, after, heatFromSteelJ: 0 };
  }
  const steels = parts.flatMap(({ steel }) => steel ?? []);
  if (steels.length === 0)
    throw new EngineError(
      "invalid-case",
      'No vessel has a wall, so no steel can take part. Give the walls, or settle out "adiabatic".',
      {},
      "start.settleOut",
    );
  const steelGainJ = (T: number): number => steels.reduce((total, steel) => total + steel.energyAtJ(T), 0);
  let last: Equilibrium | undefined;
  const at = (T: number): Equilibrium => (last = flashTV(fluid, { temperatureK: T, molarVolumeM3PerMol }, composition, last));
  const excess = (T: number): number => totalMolesMol * at(T).internalEnergyJPerMol + steelGainJ(T) - energyJ;
  const temperatures = parts.flatMap((part) => (part.steel ? [part.temperatureK, part.steelTemperatureK] : [part.temperatureK]));
  const T = risingRoot(excess, Math.min(...temperatures), Math.max(...temperatures));
  return { ...common, after: at(T), heatFromSteelJ: -steelGainJ(T) };
}

/** A function that rises with temperature: the range is widened until it holds the root. */
function risingRoot(f: (T: number) => number, low: number, high: number): number {
  let [a, b] = [low, high + 1e-9 * high];
  let [fa, fb] = [f(a), f(b)];
  for (let i = 0; i < 30 && fa > 0; i++) fa = f((a *= 0.95));
  for (let i = 0; i < 30 && fb < 0; i++) fb = f((b *= 1.05));
  if (!(fa <= 0 && fb >= 0))
    throw new EngineError("no-convergence", "Fluid and steel were not found to come to one temperature.", {}, "start.settleOut");
  return bracketedRoot(f, { a, fa, b, fb }, 1e-14 * b);
}

function compositionOf(fluid: FluidModel, { components }: SectionPart, part: number): Float64Array {
  if (!components) return fluid.feed;
  const z = new Float64Array(fluid.feed.length);
  components.forEach(({ id, moleFraction }, i) => {
    const index = fluid.componentIds.indexOf(id);
    if (index < 0)
      throw new EngineError(
        "invalid-case",
        `"${id}" is not a component of the fluid. Add it to fluid.components; its fraction there may be 0.`,
        {},
        `vessels[${part}].components[${i}].id`,
      );
    z[index] = moleFraction;
  });
  const total = z.reduce((sum, fraction) => sum + fraction, 0);
  return z.map((fraction) => fraction / total);
}
