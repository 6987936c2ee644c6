/** Random flashes of many kinds of fluid: what they end in, and how the verdicts compare with a search from every corner. */
import type { EquationId, FluidSpec } from "@/engine/cases/fluid-spec";
import { createFluidModel } from "@/engine/eos/create-fluid-model";
import type { FluidModel } from "@/engine/eos/fluid-model";
import { EngineError } from "@/engine/errors";
import type { Equilibrium } from "@/engine/flash/equilibrium";
import { flashPH } from "@/engine/flash/flash-ph";
import { flashPT } from "@/engine/flash/flash-pt";
import { flashUV } from "@/engine/flash/flash-uv";
import { testStability } from "@/engine/flash/stability";

const alkanes = ["methane", "ethane", "propane", "isobutane", "n_butane", "n_pentane", "n_hexane", "n_octane", "n_decane"];
const cubics: EquationId[] = [
  "van-der-waals",
  "redlich-kwong",
  "soave-redlich-kwong",
  "peng-robinson-1976",
  "peng-robinson-1978",
];

interface Kind {
  title: string;
  ids: string[];
  equations: EquationId[];
  mostComponents: number;
  coldestK: number;
  /** Part of all flashes. */
  share: number;
}

const dryIds = [
  ...alkanes,
  "nitrogen",
  "carbon_dioxide",
  "hydrogen_sulfide",
  "hydrogen",
  "ethylene",
  "propylene",
  "benzene",
  "argon",
  "oxygen",
];
const kinds: Kind[] = [
  { title: "dry", ids: dryIds, equations: cubics, mostComponents: 12, coldestK: 120, share: 0.8 },
  {
    title: "wet and sour",
    ids: [...alkanes, "nitrogen", "carbon_dioxide", "hydrogen_sulfide", "benzene", "water", "methanol"],
    equations: cubics.slice(2),
    mostComponents: 12,
    coldestK: 200,
    share: 0.15,
  },
  {
    title: "hydrogen, helium",
    ids: ["hydrogen", "helium", "methane", "nitrogen", "ethane"],
    equations: cubics,
    mostComponents: 5,
    coldestK: 120,
    share: 0.05,
  },
];

/** 0.5 to 350 bar, up to 600 K; every tenth is found again from its energy and enthalpy, every hundredth compared with the brute search. */
export function randomFlashes(count: number): void {
  for (const kind of kinds) {
    const random = generator(2026);
    const runs = Math.round(count * kind.share);
    const outcome = {
      one: 0,
      two: 0,
      three: 0,
      phaseLeftOut: 0,
      refused: 0,
      uncaught: 0,
      compared: 0,
      wrong: 0,
      again: 0,
      notFoundAgain: 0,
    };
    const before = process.cpuUsage();
    for (let k = 0; k < runs; k++) {
      const model = createFluidModel(randomFluid(kind, random, k));
      const state = { temperatureK: kind.coldestK + (600 - kind.coldestK) * random(), pressurePa: 5e4 * 700 ** random() };
      try {
        const found = flashPT(model, state);
        if (found.missingPhase) outcome.phaseLeftOut++;
        outcome[(["one", "two", "three"] as const)[found.phases.length - 1]!]++;
        if (k % 100 === 0) {
          outcome.compared++;
          if (isWrong(model, found)) outcome.wrong++;
        }
        if (k % 10 === 0 && !found.missingPhase) {
          outcome.again++;
          if (!isFoundAgain(model, found)) outcome.notFoundAgain++;
        }
      } catch (error) {
        if (error instanceof EngineError) outcome.refused++;
        else outcome.uncaught++;
      }
    }
    const { user, system } = process.cpuUsage(before);
    console.log(
      `Random flashes, ${kind.title}, ${runs}: ${JSON.stringify(outcome)}, ${((user + system) / Math.max(runs, 1)).toFixed(0)} µs each`,
    );
  }
}

function randomFluid(kind: Kind, random: () => number, k: number): FluidSpec {
  const ids = [...kind.ids].sort(() => random() - 0.5).slice(0, 1 + Math.floor(random() * kind.mostComponents));
  const weights = ids.map(() => (random() < 0.1 ? 10 ** (-12 * random()) : -Math.log(random() || 0.5)));
  const sum = weights.reduce((total, weight) => total + weight, 0);
  const components = ids.map((id, i) => ({ id, moleFraction: weights[i]! / sum }));
  return { equation: kind.equations[k % kind.equations.length]!, components };
}

/** Does a search from every corner find a phase that the answer has not? */
function isWrong(model: FluidModel, { temperatureK, pressurePa, phases, missingPhase }: Equilibrium): boolean {
  const limit = phases.length === 1 ? -1e-9 : -1e-7;
  const further = phases.some(
    ({ composition }) =>
      testStability(model, temperatureK, pressurePa, composition, { searches: 99 }).tangentPlaneDistance < limit,
  );
  return further !== (missingPhase ?? false);
}

function isFoundAgain(model: FluidModel, state: Equilibrium): boolean {
  try {
    return [flashUV(model, state), flashPH(model, state)].every(
      ({ temperatureK, phases }) =>
        Math.abs(temperatureK / state.temperatureK - 1) < 1e-6 && phases.length === state.phases.length,
    );
  } catch (error) {
    if (error instanceof EngineError) return false;
    throw error;
  }
}

function generator(start: number): () => number {
  let seed = start;
  return () => (seed = (seed * 1664525 + 1013904223) >>> 0) / 2 ** 32;
}
