/** Prints the cost of flashes and equations as multiples of one ln φ vector, and runs random flashes: `npm run bench -- [repeats] [flashes]`. */
import type { EquationId, FluidSpec } from "@/engine/cases/fluid-spec";
import { createFluidModel } from "@/engine/eos/create-fluid-model";
import { createPhaseState, type FluidModel } from "@/engine/eos/fluid-model";
import { createResidualDerivatives } from "@/engine/eos/residual-derivatives";
import type { Equilibrium } from "@/engine/flash/equilibrium";
import { flashPT } from "@/engine/flash/flash-pt";
import { flashUV } from "@/engine/flash/flash-uv";
import { phaseEnvelope } from "@/engine/flash/phase-envelope";
import { saturationAtTemperature } from "@/engine/flash/saturation-pure";
import { randomFlashes } from "./random-flashes";

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
  const saturation = saturationAtTemperature(model, 0.8 * model.criticalTemperaturesK[0]!, [1]);
  const v = 0.5 * (saturation.vapourVolume + saturation.liquidVolume);
  const inside = (volume: number) => model.phaseAtVolume(saturation.temperatureK, volume, [1]).internalEnergyJPerMol;
  const u = 0.5 * (inside(saturation.vapourVolume) + inside(saturation.liquidVolume));
  let near = flashUV(model, { internalEnergyJPerMol: u, molarVolumeM3PerMol: v });
  const two = microseconds(2000, () => {
    flip = 1 - flip;
    near = flashUV(model, { internalEnergyJPerMol: u + 5 * flip, molarVolumeM3PerMol: v }, [1], near);
  });
  console.log(
    `Reference equation of ${id}: evaluation ${one.toFixed(2)} µs (target 2), one-phase UV ${single.toFixed(2)} µs (target 8), two-phase UV ${two.toFixed(1)} µs (target 20)`,
  );
}

function measureThreePhases(): void {
  const model = createFluidModel(
    fluid("peng-robinson-1976", {
      methane: 0.5,
      ethane: 0.1,
      propane: 0.1,
      n_butane: 0.05,
      n_hexane: 0.1,
      n_octane: 0.05,
      water: 0.1,
    }),
  );
  const three = flashPT(model, { temperatureK: 300, pressurePa: 5e6 });
  const cold = microseconds(200, () => void flashPT(model, { temperatureK: 300, pressurePa: 5e6 }));
  let near: Equilibrium = three;
  let flip = 0;
  const warm = microseconds(500, () => {
    flip = 1 - flip;
    const internalEnergyJPerMol = three.internalEnergyJPerMol + 5 * flip;
    near = flashUV(model, { internalEnergyJPerMol, molarVolumeM3PerMol: three.molarVolumeM3PerMol }, model.feed, near);
  });
  console.log(
    `Gas, condensate and water, seven components: cold PT flash ${cold.toFixed(0)} µs, warm UV flash ${warm.toFixed(0)} µs`,
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

measureCubic("none");
measureCubic("library");
for (const id of ["methane", "nitrogen", "propane", "carbon_dioxide"]) measureReference(id);
measureOthers();
measureThreePhases();
randomFlashes(Number(process.argv[3] ?? 20000));
