/**
 * The pressure behind an opening that discharges through a pipe.
 *
 *   W_opening(p2) = W_pipe(p2):  the pipe's inlet pressure for what passes must be the pressure that the opening sees
 *   f L/d + K = (1/Ma²)(p2/p_e)² (1 − (p_e/p2)²) − 2 ln(p2/p_e),  Ma isothermal at the pipe's end, where it may reach 1 and hold p_e up
 *
 * Where the opening stays choked the pipe only sets the pressure behind it. The gas is taken at the temperature to which it is throttled at the
 * pressure behind the pipe, with its compressibility there, and the friction of fully rough flow: 1/√f = −2 log10(ε/(3.7 d)).
 *
 * Source   isothermal form of API Std 521 (`disposal/pipe-flow.ts`); friction by Colebrook 1939 at large Reynolds number
 * Holds    gas; friction of smooth pipes is higher by some per cent than the rough limit says. At the throttled temperature the isothermal form gives
 *          a slightly higher inlet pressure than adiabatic flow. Long pipes (transit time not short against the blowdown) hold gas that is left out.
 * Checks   tail-pipe.test.ts
 */
import { createPhaseState, type FluidModel } from "../eos/fluid-model";
import { inletPressurePa } from "../disposal/pipe-flow";
import { bracketedRoot } from "../ode/bracketed-root";
import { Throttle } from "./throttle";

export type TailPipe = { lengthM: number; diameterM: number; roughnessM: number; lossCoefficient: number };

type Stream = { temperatureK: number; pressurePa: number; enthalpyJPerMol: number; composition: ArrayLike<number> };
type Passed = { rateKgPerS: number; throatPressurePa: number; choked: boolean; backPressurePa: number };

const scratch = createPhaseState();

export const roughFriction = (relativeRoughness: number): number => (-2 * Math.log10(relativeRoughness / 3.7)) ** -2;

export function behindTailPipe<Flow extends Passed>(
  fluid: FluidModel,
  stream: Stream,
  { lengthM, diameterM, roughnessM, lossCoefficient }: TailPipe,
  endPressurePa: number,
  through: (behindPa: number) => Flow,
): Flow {
  const { composition } = stream;
  const free = through(endPressurePa);
  if (!(free.rateKgPerS > 0)) return free;
  const temperatureK = new Throttle(fluid, endPressurePa).temperatureK(stream, composition);
  const { compressibility } = fluid.phaseAtPressure(temperatureK, endPressurePa, composition, "vapour", scratch);
  const molarMassKgPerMol = fluid.mixtureMolarMass(composition);
  const resistance = (roughFriction(roughnessM / diameterM) * lengthM) / diameterM + lossCoefficient;
  const inletFor = (massFlowKgPerS: number): number =>
    massFlowKgPerS > 0
      ? inletPressurePa(
          { massFlowKgPerS, diameterM, temperatureK, molarMassKgPerMol, compressibility },
          endPressurePa,
          resistance,
        ).inletPa
      : endPressurePa;
  const wanted = inletFor(free.rateKgPerS);
  if (free.choked && wanted <= free.throatPressurePa) return { ...free, backPressurePa: wanted };
  const excess = (behindPa: number): number => inletFor(through(behindPa).rateKgPerS) - behindPa;
  const low = free.choked ? free.throatPressurePa : endPressurePa;
  const high = stream.pressurePa;
  const atLow = excess(low);
  if (!(atLow > 0)) return { ...through(low), backPressurePa: low };
  return through(bracketedRoot(excess, { a: low, fa: atLow, b: high, fb: endPressurePa - high }, 1e-11 * high));
}
