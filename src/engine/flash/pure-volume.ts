import { createPhaseState, type FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { bracketedRoot } from "./bracketed-root";
import { saturationAtTemperature, saturationIfAny, type PureSaturation } from "./saturation-pure";

export type PureTarget = "energy" | "entropy";

const vapour = createPhaseState();
const liquid = createPhaseState();

/**
 * Does a pure fluid of molar volume v, whose one-phase state with the wanted energy (or entropy) lies at temperature T, split?
 * It does exactly when v lies between the saturated volumes at T, for then that one-phase state is not stable.
 */
export function insideDome(model: FluidModel, T: number, v: number, z: ArrayLike<number>): PureSaturation | undefined {
  const Tc = Math.max(...Array.from(z, (fraction, i) => (fraction > 0 ? model.criticalTemperaturesK[i]! : 0)));
  if (!(T < Tc)) return undefined;
  const saturation = saturationIfAny(model, T, z);
  return saturation && v > saturation.liquidVolume && v < saturation.vapourVolume ? saturation : undefined;
}

/**
 * Saturation temperature at which a pure fluid of overall molar volume v holds the wanted molar energy or entropy: the lever
 * rule along the dome, where both rise with temperature.
 *
 * start    a temperature at which v is inside the dome
 */
export function saturatedMix(
  model: FluidModel,
  z: ArrayLike<number>,
  { v, value, kind }: { v: number; value: number; kind: PureTarget },
  start: number,
): { saturation: PureSaturation; quality: number } {
  let latest: { saturation: PureSaturation; quality: number } | undefined;
  const excess = (T: number): number => {
    const saturation = saturationAtTemperature(model, T, z, latest?.saturation.pressurePa);
    model.phaseAtVolume(T, saturation.vapourVolume, z, vapour);
    model.phaseAtVolume(T, saturation.liquidVolume, z, liquid);
    const quality = (v - saturation.liquidVolume) / (saturation.vapourVolume - saturation.liquidVolume);
    latest = { saturation, quality };
    const [gas, dense] =
      kind === "energy"
        ? [vapour.internalEnergyJPerMol, liquid.internalEnergyJPerMol]
        : [vapour.entropyJPerMolK, liquid.entropyJPerMolK];
    return dense + quality * (gas - dense) - value;
  };
  const Tc = model.criticalTemperaturesK[z.length === 1 ? 0 : indexOfOnly(z)]!;
  let a = start;
  let fa = excess(a);
  let b = a;
  let fb = fa;
  let ceiling = Tc; // lowered where the two phases can no longer be told apart
  for (let k = 0; k < 80 && fa * fb > 0; k++) {
    a = b;
    fa = fb;
    b = fb > 0 ? Math.max(b * 0.93, model.temperatureRangeK[0]) : Math.min(b * 1.04, 0.5 * (b + ceiling));
    try {
      fb = excess(b);
    } catch (error) {
      if (!(error instanceof EngineError) || b < a) throw error;
      ceiling = b;
      b = a;
      fb = fa;
    }
  }
  const T = bracketedRoot(excess, { a, fa, b, fb }, { within: 1e-13 * start, what: "saturation temperature at given volume" });
  excess(T);
  return latest!;
}

function indexOfOnly(z: ArrayLike<number>): number {
  for (let i = 0; i < z.length; i++) if (z[i]! > 0) return i;
  return 0;
}
