import type { Warning } from "../cases/warning";
import type { FluidModel } from "./fluid-model";

/** Range below the heat-capacity data that a form may be stretched with no more than a mention [K]. */
const heatCapacityGraceK = 20;
/** A Soave-type α is outside its use above this reduced temperature. */
const alphaReducedTemperature = 5;
const alphaMoleFraction = 0.05;

/**
 * What has to be said about a fluid and the temperatures it was evaluated at, whatever the calculation was.
 *
 * Source   thresholds: F-CP-1, F-EOS-3 and F-EOS-4 of docs/methods/fitness.md (policy, ours)
 */
export function stateWarnings(model: FluidModel, temperaturesK: readonly number[], z: ArrayLike<number> = model.feed): Warning[] {
  const warnings: Warning[] = [];
  const coldest = Math.min(...temperaturesK);
  const hottest = Math.max(...temperaturesK);

  const stretched = model.substances.filter(
    ({ heatCapacityRangeK: [low, high] }, i) => z[i]! > 0 && (coldest < low || hottest > high),
  );
  if (stretched.length > 0) {
    const far = stretched.some(
      ({ heatCapacityRangeK: [low, high] }) => coldest < low - heatCapacityGraceK || hottest > high + heatCapacityGraceK,
    );
    warnings.push({
      code: far ? "heat-capacity-far-outside-range" : "heat-capacity-outside-range",
      message: `The ideal-gas heat capacity of ${list(stretched.map(({ id }) => id))} is used ${far ? "more than 20 K " : ""}outside the range of its data (${formatK(coldest)} to ${formatK(hottest)} needed).`,
    });
  }
  if (model.equation === "van-der-waals" || model.equation === "redlich-kwong") {
    warnings.push({
      code: "equation-for-comparison-only",
      message: "van der Waals and Redlich-Kwong are kept for comparison: not a basis for signing.",
    });
  }
  if (model.equation === "soave-redlich-kwong" || model.equation.startsWith("peng-robinson")) {
    const hot = model.substances.filter(
      ({ criticalTemperatureK }, i) => z[i]! > alphaMoleFraction && hottest > alphaReducedTemperature * criticalTemperatureK,
    );
    if (hot.length > 0) {
      warnings.push({
        code: "alpha-function-outside-use",
        message: `${list(hot.map(({ id }) => id))} is above five times its critical temperature, where the temperature function of this equation was not fitted.`,
      });
    }
  }
  for (const note of model.notes) warnings.push({ code: "fluid-note", message: note });
  return warnings;
}

const formatK = (T: number) => `${T.toFixed(1)} K`;

function list(words: readonly string[]): string {
  return words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}
