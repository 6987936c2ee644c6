import { EngineError } from "../errors";
import type { FluidModel } from "../eos/fluid-model";
import { saturationPoint } from "./flash-quality";
import { solveLinear } from "./linear-solve";
import { createSaturationWork, evaluateSaturation, solveSaturation, type SaturationPoint } from "./saturation-newton";
import { onlyComponent, saturationAtTemperature } from "./saturation-pure";

export interface EnvelopePoint {
  temperatureK: number;
  pressurePa: number;
  line: "dew" | "bubble";
}

export interface PhaseEnvelope {
  /** From the dew line at low pressure, over the critical point, down the bubble line. */
  points: EnvelopePoint[];
  /** Absent where the line was left before it was met (open envelopes). */
  critical?: { temperatureK: number; pressurePa: number };
  cricondentherm?: { temperatureK: number; pressurePa: number };
  cricondenbar?: { temperatureK: number; pressurePa: number };
  /** Why the trace stopped. */
  endedBy: "low-pressure" | "high-pressure" | "cold" | "points" | "lost";
}

const startPressurePa = 1e5;
const lowestPressurePa = 1e5;
const highestPressurePa = 1e8;
const maximumPoints = 400;
/** Around the critical point all K are 1 and every state solves the equations: ln K of the leading component is not set inside this. */
const criticalGap = 0.04;

/** A converged point with its tangent along the line. */
interface Node {
  x: Float64Array; // ln K_1 … ln K_n, ln T, ln p
  tangent: Float64Array; // dx/ds for the specified unknown s
  specified: number;
}

/**
 * The phase envelope of a mixture, or the line of another vapour share inside it, traced from 1 bar: at each point the unknown that changes fastest is the one
 * that is set, so the trace runs through temperature and pressure maxima, and over the critical point by changing the sign of ln K.
 *
 * share    vapour mole fraction Q of the line, above 0. Past the critical point the phases have changed places: the line named "bubble" is
 *          then that of 1 − Q. A pure fluid has one line for every share
 * Source   Michelsen, Fluid Phase Equilib. 4 (1980) 1-10.
 * Throws   EngineError "no-convergence" when no first point is found
 */
export function phaseEnvelope(model: FluidModel, z: ArrayLike<number> = model.feed, share = 1): PhaseEnvelope {
  if (onlyComponent(z) >= 0) return pureEnvelope(model, z);
  const count = z.length;
  const size = count + 2;
  const work = createSaturationWork(count);
  const first = saturationPoint(model, z, share, { lnP: Math.log(startPressurePa) }, work);
  let node = nodeAt(model, z, share, pack(first), work);
  const nodes: Node[] = [node];
  let direction = Math.sign(node.tangent[count + 1]!) || 1; // up in pressure
  let step = 0.1;
  let endedBy: PhaseEnvelope["endedBy"] = "points";
  let crossed = -1;

  while (nodes.length < maximumPoints) {
    const { x, tangent, specified } = node;
    const point = unpack(x, count);
    let value = x[specified]! + direction * step;
    const isRatio = specified < count;
    if (isRatio && Math.abs(value) < criticalGap) value = -Math.sign(x[specified]!) * criticalGap; // over the critical point
    const along = value - x[specified]!;
    for (let i = 0; i < count; i++) point.lnK[i] = x[i]! + along * tangent[i]!;
    point.lnT = x[count]! + along * tangent[count]!;
    point.lnP = x[count + 1]! + along * tangent[count + 1]!;
    const iterations = solveSaturation(model, z, share, point, specified, value, work, 10);
    const next = pack(point);
    if (iterations < 0 || jumped(x, next, size)) {
      step *= 0.4;
      if (step < 1e-5) {
        endedBy = "lost";
        break;
      }
      continue;
    }
    if (isRatio && x[specified]! * value < 0) crossed = nodes.length;
    const previous = node;
    node = nodeAt(model, z, share, next, work);
    // Keep going the same way when the specified unknown changes.
    direction = Math.sign(dot(node.tangent, difference(next, previous.x)));
    nodes.push(node);
    step = Math.min(step * (iterations <= 3 ? 1.5 : iterations >= 6 ? 0.6 : 1), node.specified < count ? 0.4 : 0.08);
    const p = Math.exp(point.lnP);
    const T = Math.exp(point.lnT);
    if (p > highestPressurePa) endedBy = "high-pressure";
    else if (p < lowestPressurePa && nodes.length > 3) endedBy = "low-pressure";
    else if (T < 0.3 * coldestCritical(model, z)) endedBy = "cold";
    else continue;
    break;
  }
  return describe(nodes, crossed, count, endedBy);
}

function pureEnvelope(model: FluidModel, z: ArrayLike<number>): PhaseEnvelope {
  const index = onlyComponent(z);
  const Tc = model.criticalTemperaturesK[index]!;
  const critical = { temperatureK: Tc, pressurePa: model.criticalPressuresPa[index]! };
  const points: EnvelopePoint[] = [];
  for (let k = 60; k >= 0; k--) {
    const temperatureK = Tc * (1 - 0.5 * (k / 60) ** 2 - 1e-6);
    if (temperatureK < model.temperatureRangeK[0]) continue;
    points.push({ temperatureK, pressurePa: saturationAtTemperature(model, temperatureK, z).pressurePa, line: "dew" });
  }
  const bubble = points.map((point): EnvelopePoint => ({ ...point, line: "bubble" })).reverse();
  return { points: [...points, ...bubble], critical, cricondentherm: critical, cricondenbar: critical, endedBy: "low-pressure" };
}

function coldestCritical(model: FluidModel, z: ArrayLike<number>): number {
  let coldest = Infinity;
  for (let i = 0; i < z.length; i++) if (z[i]! > 1e-6) coldest = Math.min(coldest, model.criticalTemperaturesK[i]!);
  return coldest;
}

const pack = ({ lnK, lnT, lnP }: SaturationPoint): Float64Array => Float64Array.of(...lnK, lnT, lnP);
const unpack = (x: Float64Array, count: number): SaturationPoint => ({
  lnK: x.slice(0, count),
  lnT: x[count]!,
  lnP: x[count + 1]!,
});
const difference = (a: Float64Array, b: Float64Array) => a.map((value, i) => value - b[i]!);
const dot = (a: Float64Array, b: Float64Array) => a.reduce((sum, value, i) => sum + value * b[i]!, 0);

/** Did a correction land on another branch? */
function jumped(from: Float64Array, to: Float64Array, size: number): boolean {
  for (let i = 0; i < size; i++) if (Math.abs(to[i]! - from[i]!) > (i < size - 2 ? 2.5 : i === size - 2 ? 0.2 : 1)) return true;
  return false;
}

/** Tangent at a converged point, scaled to the unknown that changes fastest. */
function nodeAt(
  model: FluidModel,
  z: ArrayLike<number>,
  share: number,
  x: Float64Array,
  work: ReturnType<typeof createSaturationWork>,
): Node {
  const count = z.length;
  const size = count + 2;
  evaluateSaturation(model, z, share, unpack(x, count), work);
  // Any independent row fixes the tangent's length; ln p − ln T is one that never stalls at a maximum of either.
  work.jacobian[(count + 1) * size + count + 1] = 1;
  work.jacobian[(count + 1) * size + count] = -0.37;
  const tangent = new Float64Array(size);
  tangent[size - 1] = 1;
  if (!solveLinear(work.jacobian, tangent, size)) {
    throw new EngineError("no-convergence", "the phase envelope has no tangent here", {
      temperatureK: Math.exp(x[count]!),
      pressurePa: Math.exp(x[count + 1]!),
    });
  }
  let specified = 0;
  // ln T and ln p count four times: a step of theirs is worth that much of ln K in the shape of the curve.
  const weight = (i: number) => (i < count ? 1 : 4);
  for (let i = 1; i < size; i++) {
    if (weight(i) * Math.abs(tangent[i]!) > weight(specified) * Math.abs(tangent[specified]!)) specified = i;
  }
  const scale = tangent[specified]!;
  return { x, tangent: tangent.map((value) => value / scale), specified };
}

function describe(nodes: readonly Node[], crossed: number, count: number, endedBy: PhaseEnvelope["endedBy"]): PhaseEnvelope {
  const state = (lnT: number, lnP: number) => ({ temperatureK: Math.exp(lnT), pressurePa: Math.exp(lnP) });
  const points = nodes.map(({ x }, i): EnvelopePoint => ({
    ...state(x[count]!, x[count + 1]!),
    line: crossed >= 0 && i >= crossed ? "bubble" : "dew",
  }));
  const envelope: PhaseEnvelope = { points, endedBy };
  if (crossed > 0) {
    const at = between(nodes[crossed - 1]!, nodes[crossed]!, (x, specified) => x[specified]!, "zero");
    if (at) envelope.critical = state(at[count]!, at[count + 1]!);
  }
  const maximum = (index: number) => {
    for (let i = 1; i < nodes.length; i++) {
      const at = between(nodes[i - 1]!, nodes[i]!, (x) => x[index]!, "maximum", index);
      if (at) return state(at[count]!, at[count + 1]!);
    }
    return undefined;
  };
  const hottest = maximum(count);
  const highest = maximum(count + 1);
  if (hottest) envelope.cricondentherm = hottest;
  if (highest) envelope.cricondenbar = highest;
  return envelope;
}

/** Cubic Hermite curve between two neighbours in the unknown that the first one specifies; the place of a zero or a maximum. */
function between(
  a: Node,
  b: Node,
  read: (x: Float64Array, specified: number) => number,
  goal: "zero" | "maximum",
  index = -1,
): Float64Array | undefined {
  const { specified } = a;
  const h = b.x[specified]! - a.x[specified]!;
  if (h === 0 || Math.abs(b.tangent[specified]!) < 1e-6) return undefined;
  const slopesB = b.tangent.map((value) => value / b.tangent[specified]!);
  const at = (t: number): Float64Array => {
    const [t2, t3] = [t * t, t * t * t];
    return a.x.map(
      (value, i) =>
        value * (2 * t3 - 3 * t2 + 1) +
        a.tangent[i]! * h * (t3 - 2 * t2 + t) +
        b.x[i]! * (3 * t2 - 2 * t3) +
        slopesB[i]! * h * (t3 - t2),
    );
  };
  if (goal === "zero") {
    const t = -read(a.x, specified) / h;
    return t >= 0 && t <= 1 ? at(t) : undefined;
  }
  const slope = (t: number) => {
    const [t2] = [t * t];
    return (
      (6 * t2 - 6 * t) * a.x[index]! +
      (3 * t2 - 4 * t + 1) * h * a.tangent[index]! +
      (6 * t - 6 * t2) * b.x[index]! +
      (3 * t2 - 2 * t) * h * slopesB[index]!
    );
  };
  // A maximum: rising at the first end, falling at the second.
  if (!(slope(0) > 0 && slope(1) < 0)) return undefined;
  let [low, high] = [0, 1];
  for (let k = 0; k < 60; k++) {
    const middle = 0.5 * (low + high);
    if (slope(middle) > 0) low = middle;
    else high = middle;
  }
  return at(0.5 * (low + high));
}
