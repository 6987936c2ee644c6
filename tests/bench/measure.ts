/** Prints the speed of the engine: CPU milliseconds, evaluations, steps, and the ratio to one vector of ln φ of the same fluid. `npm run bench -- fuzz [flashes]` runs random flashes instead. */
import { createFluidModel } from "@/engine/eos/create-fluid-model";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import { runBlowdown } from "@/engine/cases/blowdown/run-blowdown";
import { benchCases } from "./cases";

if (process.argv[2] === "fuzz") {
  const { randomFlashes } = await import("./random-flashes");
  randomFlashes(Number(process.argv[3] ?? 100_000));
  process.exit();
}

const repeats = Number(process.argv[2] ?? 25);

const cpuMs = (): number => {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
};

function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN;
}

function timeOf(work: () => void): { first: number; median: number; least: number } {
  const times = Array.from({ length: repeats }, () => {
    const before = cpuMs();
    work();
    return cpuMs() - before;
  });
  return { first: times[0] ?? Number.NaN, median: median(times.slice(Math.floor(repeats / 3))), least: Math.min(...times) };
}

/** CPU microseconds of one ln φ vector at 60 bar, 320 K. */
function lnPhiUs(fluid: FluidSpec): number {
  const model = createFluidModel(fluid);
  const out = new Float64Array(model.componentIds.length);
  const calls = 20000;
  const { least } = timeOf(() => {
    for (let i = 0; i < calls; i++) model.lnFugacityCoefficients(320 + 1e-6 * i, 6e6, model.feed, "stable", out);
  });
  return (least * 1000) / calls;
}

console.log(`CPU time of one core, ${repeats} runs each, relative tolerance 1e-5; the machine may be shared.`);
for (const { title, targetMs, document } of benchCases) {
  let facts = "";
  const time = timeOf(() => {
    const { numerics, series, summary } = runBlowdown(document);
    facts = `${numerics.evaluations} evaluations, ${numerics.steps} steps, ${series.timeS.length} rows, ended by ${summary.endedBy} at ${summary.endTimeS.toPrecision(4)} s`;
  });
  const one = lnPhiUs(document.fluid);
  console.log(
    `${title}: median ${time.median.toFixed(1)} ms (target ${targetMs}), least ${time.least.toFixed(1)}, first ${time.first.toFixed(0)}; ${((1000 * time.median) / one).toFixed(0)} times one ln φ vector (${one.toFixed(2)} µs); ${facts}`,
  );
}
await import("./thermodynamics");
