/** What settling out did, as the result tells it: each vessel before, the section after, and what is kept. */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { SettleOutReport } from "../cases/blowdown-result";
import type { FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { settle, type Settled } from "./settle-out";

export function settleOutReport(fluid: FluidModel, settled: Settled, start: BlowdownCase["start"]): SettleOutReport {
  const { parts, volumeM3, composition, totalMolesMol, after, heatFromSteelJ, rule } = settled;
  const massKg = totalMolesMol * fluid.mixtureMolarMass(composition);
  const before = parts.reduce((sum, part) => sum + part.internalEnergyJ, 0);
  const magnitude = parts.reduce((sum, part) => sum + Math.abs(part.internalEnergyJ), Math.abs(heatFromSteelJ));
  const internalEnergyAfterJ = totalMolesMol * after.internalEnergyJPerMol;
  const other = rule === "adiabatic" ? "with-steel" : "adiabatic";
  const alternative = parts.some((part) => part.steel) ? settledBy(fluid, settled, other) : undefined;
  return {
    vessels: parts.map((part) => ({
      name: part.name,
      volumeM3: part.volumeM3,
      pressurePa: part.pressurePa,
      temperatureK: part.temperatureK,
      massKg: part.massKg,
      // The section is taken to be mixed: each volume then holds its share of the whole.
      movesKg: (massKg * part.volumeM3) / volumeM3 - part.massKg,
    })),
    after: {
      volumeM3,
      pressurePa: after.pressurePa,
      temperatureK: after.temperatureK,
      massKg,
      vapourMoleFraction: after.vapourMoleFraction,
    },
    composition: Object.fromEntries(fluid.componentIds.map((id, i) => [id, composition[i] ?? 0])),
    internalEnergyBeforeJ: before,
    internalEnergyAfterJ,
    heatFromSteelJ,
    massClosure: Math.abs(massKg - parts.reduce((sum, part) => sum + part.massKg, 0)) / massKg,
    energyClosure: Math.abs(internalEnergyAfterJ - before - heatFromSteelJ) / magnitude,
    ...(rule === "with-steel" ? { steelTemperatureK: after.temperatureK } : {}),
    ...(alternative ? { alternative: { rule: other, ...alternative } } : {}),
    ...(start.restAtTemperatureK === undefined ? {} : { restAtTemperatureK: start.restAtTemperatureK }),
  };
}

/** A rule that was not asked for may have no answer; the report then goes without. */
function settledBy(
  fluid: FluidModel,
  { parts }: Settled,
  rule: Settled["rule"],
): { pressurePa: number; temperatureK: number } | undefined {
  try {
    const { pressurePa, temperatureK } = settle(fluid, parts, rule).after;
    return { pressurePa, temperatureK };
  } catch (error) {
    if (error instanceof EngineError) return undefined;
    throw error;
  }
}
