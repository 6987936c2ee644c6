/** Prints the cost of flashes and equations as multiples of one ln φ vector, and runs random flashes: `npm run bench -- [repeats] [flashes]`. */
import type { EquationId, FluidSpec } from "@/engine/cases/fluid-spec";
import { createFluidModel } from "@/engine/eos/create-fluid-model";
import { createPhaseState, type FluidModel } from "@/engine/eos/fluid-model";
import { createResidualDerivatives } from "@/engine/eos/residual-derivatives";
import { EngineError } from "@/engine/errors";
import type { Equilibrium } from "@/engine/flash/equilibrium";
import { flashPT } from "@/engine/flash/flash-pt";
import { flashUV } from "@/engine/flash/flash-uv";
import { phaseEnvelope } from "@/engine/flash/phase-envelope";
import { testStability } from "@/engine/flash/stability";

const tenComponents: Record<string, number> = {
  methane: 0.7,
  ethane: 0.09,
  propane: 0.06,
  isobutane: 0.02,
  n_butane: 0.03,
  isopentane: 0.01,
  n_pentane: 0.01,
  n_hexane: 0.02,
  nitrogen: 0.03,
  carbon_dioxide: 0.03,
};

const fluid = (
  equation: EquationId,
  composition: Record<string, number>,
  interaction: "library" | "none" = "library",
): FluidSpec => ({
  equation,
  interaction,
  components: Object.entries(composition).map(([id, moleFraction]) => ({ id, moleFraction })),
});

/** Least CPU microseconds of one call over nine rounds, after as many calls to warm up. */
function microseconds(calls: number, work: () => void): number {
  let least = Infinity;
  for (let round = 0; round < 10; round++) {
    const before = process.cpuUsage();
    for (let i = 0; i < calls; i++) work();
    const { user, system } = process.cpuUsage(before);
    if (round > 0) least = Math.min(least, (user + system) / calls);
  }
  return least;
}

const row = (what: string, cost: number, unit: number, target: string) =>
  console.log(`  ${what}: ${cost.toFixed(2)} µs, ${(cost / unit).toFixed(1)} ln φ vectors (target ${target})`);

function measureCubic(interaction: "library" | "none"): void {
  const model = createFluidModel(fluid("peng-robinson-1976", tenComponents, interaction));
  const z = model.feed;
  const lnPhi = new Float64Array(z.length);
  const state = createPhaseState();
  const derivatives = createResidualDerivatives(z.length);
  let drift = 0;
  const one = microseconds(20000, () => model.lnFugacityCoefficients(300 + (drift += 1e-9), 7e6, z, "stable", lnPhi));
  console.log(`Peng-Robinson, ten components, kij ${interaction}: one ln φ vector ${one.toFixed(3)} µs`);
  const all = microseconds(20000, () => {
    model.residual.setComposition(z);
    model.residual.evaluate(300 + (drift += 1e-9), 3e-4, 2, derivatives);
  });
  row("phase with all second derivatives", all, one, "6");
  const start = { ...model.phaseAtPressure(320, 7e6, z) };
  let flip = 0;
  const single = microseconds(20000, () => {
    flip = 1 - flip;
    model.phaseFromEnergy(
      start.internalEnergyJPerMol + 25 * flip,
      start.molarVolumeM3PerMol,
      z,
      state.temperatureK || 320,
      state,
    );
  });
  row("one-phase UV, warm", single, one, "12");
  row(
    "PT flash, cold, two phases, with stability",
    microseconds(1000, () => void flashPT(model, { temperatureK: 260, pressurePa: 5e6 })),
    one,
    "120",
  );
  const two = flashPT(model, { temperatureK: 260, pressurePa: 5e6 });
  let near: Equilibrium = two;
  const warm = microseconds(1000, () => {
    flip = 1 - flip;
    const internalEnergyJPerMol = two.internalEnergyJPerMol + 5 * flip;
    near = flashUV(model, { internalEnergyJPerMol, molarVolumeM3PerMol: two.molarVolumeM3PerMol }, z, near);
  });
  row("UV flash, warm, two phases", warm, one, interaction === "none" ? "55" : "140");
}

function measureReference(id: string): void {
  const model = createFluidModel(fluid("reference", { [id]: 1 }));
  const derivatives = createResidualDerivatives(1);
  const state = createPhaseState();
  let drift = 0;
  model.residual.setComposition([1]);
  const one = microseconds(20000, () => model.residual.evaluate(300, 3e-4 * (1 + (drift += 1e-10)), 2, derivatives));
  const start = { ...model.phaseAtPressure(320, 7e6, [1]) };
  let flip = 0;
  const single = microseconds(5000, () => {
    flip = 1 - flip;
    model.phaseFromEnergy(
      start.internalEnergyJPerMol + 25 * flip,
      start.molarVolumeM3PerMol,
      [1],
      state.temperatureK || 320,
      state,
    );
  });
  console.log(
    `Reference equation of ${id}: evaluation ${one.toFixed(2)} µs (target 2), one-phase UV ${single.toFixed(2)} µs (target 8)`,
  );
}

function measureOthers(): void {
  const gerg: FluidModel = createFluidModel(fluid("gerg-2008", tenComponents));
  gerg.residual.setComposition(gerg.feed);
  const density = microseconds(500, () => void gerg.residual.volumeAtPressure(300, 7e6, "stable"));
  console.log(`GERG-2008 density of ten components at 300 K, 70 bar: ${density.toFixed(1)} µs (target 60)`);
  const rich = createFluidModel(
    fluid("peng-robinson-1976", { ...tenComponents, methane: 0.69, n_heptane: 0.005, n_octane: 0.005 }),
  );
  const envelope = microseconds(3, () => void phaseEnvelope(rich)) / 1000;
  console.log(`Phase envelope of twelve components: ${envelope.toFixed(1)} ms (target 100)`);
}

const dryIds = [
  "methane",
  "ethane",
  "propane",
  "isobutane",
  "n_butane",
  "n_pentane",
  "n_hexane",
  "n_octane",
  "n_decane",
  "nitrogen",
];
const otherIds = ["carbon_dioxide", "hydrogen_sulfide", "hydrogen", "ethylene", "propylene", "benzene", "argon", "oxygen"];
const cubics: EquationId[] = [
  "van-der-waals",
  "redlich-kwong",
  "soave-redlich-kwong",
  "peng-robinson-1976",
  "peng-robinson-1978",
];

/** Random flashes of 1 to 12 components, 0.5 to 350 bar, 120 to 600 K; every hundredth verdict against a search from every corner. */
function randomFlashes(count: number): void {
  let seed = 2026;
  const random = () => (seed = (seed * 1664525 + 1013904223) >>> 0) / 2 ** 32;
  const outcome = { one: 0, two: 0, third: 0, refused: 0, uncaught: 0, wrong: 0, compared: 0 };
  const before = process.cpuUsage();
  for (let k = 0; k < count; k++) {
    const ids = [...dryIds, ...otherIds].sort(() => random() - 0.5).slice(0, 1 + Math.floor(random() * 12));
    const weights = ids.map(() => (random() < 0.1 ? 10 ** (-12 * random()) : -Math.log(random() || 0.5)));
    const sum = weights.reduce((total, weight) => total + weight, 0);
    const composition = Object.fromEntries(ids.map((id, i) => [id, weights[i]! / sum]));
    const model = createFluidModel(fluid(cubics[k % cubics.length]!, composition));
    const temperatureK = 120 + 480 * random();
    const pressurePa = 5e4 * 700 ** random();
    try {
      const found = flashPT(model, { temperatureK, pressurePa });
      if (found.missingPhase) outcome.third++;
      else if (found.phases.length === 2) outcome.two++;
      else outcome.one++;
      if (k % 100 === 0) {
        outcome.compared++;
        const brute = testStability(model, temperatureK, pressurePa, model.feed, { searches: 99 });
        if (found.phases.length === 1 && brute.tangentPlaneDistance < -1e-9) outcome.wrong++;
      }
    } catch (error) {
      if (error instanceof EngineError) outcome.refused++;
      else outcome.uncaught++;
    }
  }
  const { user, system } = process.cpuUsage(before);
  console.log(`Random flashes: ${JSON.stringify(outcome)}, ${((user + system) / count).toFixed(0)} µs each`);
}

measureCubic("none");
measureCubic("library");
for (const id of ["methane", "nitrogen", "carbon_dioxide"]) measureReference(id);
measureOthers();
randomFlashes(Number(process.argv[3] ?? 20000));
