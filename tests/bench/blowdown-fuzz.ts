/**
 * Runs random blowdowns and says how they ended: `node <bundle> [first] [count] [confirm]`. Each may take five seconds.
 *
 * With `confirm` 1 each is run again at a tenfold tighter tolerance and must agree to 0.5 % in time and 1 K.
 */
import { runBlowdown } from "@/engine/cases/blowdown/run-blowdown";
import { EngineError } from "@/engine/errors";
import { randomBlowdown } from "../fixtures/random-blowdown";

const [first = 0, count = 200, confirm = 1] = process.argv.slice(2).map(Number);
const limitMs = 5000;
const cpuMs = (): number => {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
};
const times: number[] = [];
const tally = new Map<string, number[]>();
const note = (what: string, seed: number): void => void tally.set(what, [...(tally.get(what) ?? []), seed]);

for (let seed = first; seed < first + count; seed++) {
  if (seed > first && (seed - first) % 50 === 0) report(seed - first);
  const document = randomBlowdown(seed);
  const before = cpuMs();
  const until = performance.now() + limitMs;
  const isCancelled = (): boolean => performance.now() > until;
  try {
    const { summary, series } = runBlowdown(document, { isCancelled });
    times.push(cpuMs() - before);
    const numbers = [...Object.values(summary), ...Object.values(series).flat()].filter((value) => typeof value === "number");
    if (!numbers.every(Number.isFinite)) note("NaN", seed);
    if (Math.max(summary.massClosure, 1e-3 * summary.energyClosure) > 1e-9) note("closure", seed);
    if (confirm) {
      const tighter = runBlowdown(document, {
        relativeTolerance: 1e-6,
        isCancelled: () => performance.now() > until + 4 * limitMs,
      });
      const dt = Math.abs(tighter.summary.endTimeS / summary.endTimeS - 1);
      const dT = Math.max(
        Math.abs(tighter.summary.minimumFluidTemperatureK - summary.minimumFluidTemperatureK),
        Math.abs((tighter.summary.minimumWallTemperatureK ?? 0) - (summary.minimumWallTemperatureK ?? 0)),
      );
      if (dt > 5e-3 || dT > 1 || tighter.summary.endedBy !== summary.endedBy) note("not confirmed", seed);
      else note("confirmed", seed);
    } else note("ended", seed);
  } catch (error) {
    times.push(cpuMs() - before);
    if (error instanceof EngineError) note(`${error.code}: ${error.message.replace(/[\d.e+-]{2,}/g, "#").slice(0, 90)}`, seed);
    else note(`UNTYPED ${String(error).slice(0, 120)}`, seed);
  }
}
report(count);

function report(done: number): void {
  const sorted = [...times].sort((a, b) => a - b);
  const at = (part: number): string => (sorted[Math.floor(part * (sorted.length - 1))] ?? Number.NaN).toFixed(1);
  console.log(`${done} cases from ${first}: CPU ms median ${at(0.5)}, p95 ${at(0.95)}, p99 ${at(0.99)}, most ${at(1)}`);
  for (const [what, seeds] of [...tally].sort((a, b) => b[1].length - a[1].length))
    console.log(`${seeds.length} ${what}${what === "confirmed" || what === "ended" ? "" : ` [${seeds.slice(0, 12).join(" ")}]`}`);
}
