/** One piece of steel through a fire: its temperature, stress and strength, with or without the blowdown. */
import type { SteelInFireItem } from "../cases/blowdown-result";
import { heatUp } from "./heat-up";
import type { Item } from "./items";
import { crossingTime, strengthPa, stressPa, type StrengthRule } from "./rupture";
import type { Surroundings } from "./surroundings";

const steps = 600;
const shownPoints = 100;
/** Nucleate boiling holds a wetted wall within 10 to 50 K of its liquid; the upper end is taken. */
const boilingExcessK = 50;

export type Setting = Surroundings & {
  fire: (wallK: number) => number;
  horizonS: number;
  shutInPressurePa: number;
  strengthFraction: number;
};

export type Followed = {
  timeS: number[];
  wallTemperatureK: number[];
  stressPa: number[];
  strengthPa: number[];
  ruptureTimeS: number | undefined;
};

export function follow(
  item: Item,
  setting: Setting,
  rule: StrengthRule,
  { fluxFactor, untilS, heldPressurePa }: { fluxFactor: number; untilS: number; heldPressurePa?: number },
): Followed {
  const wetUntilS = item.part === "wet" ? Math.min(heldPressurePa === undefined ? setting.liquidUntilS : untilS, untilS) : 0;
  const parts = 1 - wetUntilS / untilS;
  const timeS: number[] = [];
  const wallTemperatureK: number[] = [];
  let startK = setting.startK;
  for (let i = 0, count = Math.round(steps * (1 - parts)); i < count; i++) {
    const t = (i * wetUntilS) / count;
    timeS.push(t);
    wallTemperatureK.push(Math.max(setting.liquidAt(t) + (i === 0 ? 0 : boilingExcessK), setting.startK));
    startK = wallTemperatureK.at(-1) ?? startK;
  }
  if (wetUntilS < untilS) {
    const dry = heatUp(
      {
        steel: item.steel,
        thicknessM: item.thicknessM,
        startK,
        fireFluxWPerM2: (T) => fluxFactor * setting.fire(T),
        insideFluxWPerM2: (t, T) => setting.film(t, T - setting.fluidAt(t)),
      },
      { fromS: wetUntilS, untilS, steps: Math.max(Math.round(steps * parts), 20) },
    );
    timeS.push(...dry.timeS);
    wallTemperatureK.push(...dry.temperatureK);
  }
  const stress = timeS.map((t) => stressPa(item, heldPressurePa ?? setting.pressureAt(t)));
  const strength = wallTemperatureK.map((T) => strengthPa(item.steel, rule, T));
  return { timeS, wallTemperatureK, stressPa: stress, strengthPa: strength, ruptureTimeS: crossingTime(timeS, strength, stress) };
}

/** Without stress there is no ratio; a large one stands for it. */
const largestRatio = 1000;

export function leastOf({ timeS, stressPa: stress, strengthPa: strength }: Followed): {
  leastRatio: number;
  leastRatioTimeS: number;
} {
  let leastRatio = largestRatio;
  let leastRatioTimeS = 0;
  stress.forEach((load, i) => {
    const ratio = load > 0 ? (strength[i] ?? 0) / load : largestRatio;
    if (ratio >= leastRatio) return;
    leastRatio = ratio;
    leastRatioTimeS = timeS[i] ?? 0;
  });
  return { leastRatio, leastRatioTimeS };
}

export function thinned({
  timeS,
  wallTemperatureK,
  stressPa: stress,
  strengthPa: strength,
}: Followed): SteelInFireItem["series"] {
  const every = Math.max(Math.floor(timeS.length / shownPoints), 1);
  const keep = <T>(list: T[]): T[] => list.filter((_, i) => i % every === 0 || i === list.length - 1);
  return { timeS: keep(timeS), wallTemperatureK: keep(wallTemperatureK), stressPa: keep(stress), strengthPa: keep(strength) };
}
