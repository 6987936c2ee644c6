/**
 * Does the blowdown lower the stress faster than the fire takes the strength?
 *
 * Each piece of steel heats up from the start of the fire, which is the opening of the valve. Dry steel is cooled by the gas film only (not
 * at all where the run has none). Wetted steel stays 50 K above the liquid until the liquid is gone, and then heats up like dry steel.
 *
 *   ratio = strength / stress, least over the run          1 is rupture; near up to 1.1
 *
 * Beside it: the time to rupture, the same with 30 % more flux, and the same with the section shut in at its highest pressure.
 * Source   methods of `heat-up.ts` and `rupture.ts`
 * Holds    an order of magnitude: 30 % in flux changes the time by about as much. No jet's own cooling or erosion, no creep
 * Checks   steel-in-fire.test.ts
 */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { SteelInFire, SteelInFireItem, Verdict } from "../cases/blowdown-result";
import { follow, leastOf, thinned, type Setting } from "./follow";
import { itemsInFire, type Item } from "./items";
import type { StrengthRule } from "./rupture";
import { fireOf, liquidUntil, surroundingsOf, type FireRun } from "./surroundings";

const defaultStrengthFraction = 0.85;
const moreFlux = 1.3;
const nearRatio = 1.1;
/** Shut in, at least an hour of fire is looked at. */
const shutInHorizonS = 3600;
const softeningK = 673.15;

/** Undefined where there is no fire, or no steel whose diameter is known. */
export function steelInFire(blowdown: BlowdownCase, run: FireRun): SteelInFire | undefined {
  const fire = fireOf(blowdown);
  if (!fire) return undefined;
  const { series, summary } = run;
  const wetted = liquidUntil(series) > 0;
  const items = itemsInFire(blowdown, wetted);
  if (items.length === 0) return undefined;

  const given = blowdown.steelInFire ?? {};
  const strengthFraction = given.strengthFraction ?? defaultStrengthFraction;
  const horizonS = Math.max(summary.endTimeS, blowdown.limits?.targetTimeS ?? 0);
  const shutInPressurePa = Math.max(summary.initialPressurePa, blowdown.vessel.wall?.designPressurePa ?? 0);
  const surroundings = surroundingsOf(blowdown, run);
  const setting: Setting = { fire: fire.fluxWPerM2, horizonS, shutInPressurePa, strengthFraction, ...surroundings };
  const looked = items.map((item) => look(item, setting, given.tensileStrengthPa, summary.timeToTargetPressureS));
  const worst = looked.reduce((least, item, i) => (item.leastRatio < (looked[least]?.leastRatio ?? 0) ? i : least), 0);
  const judged = looked.map((item, i) => ({ ...item, governs: i === worst }));
  const governing = judged[worst];
  const depressurisationWins = judged.every((item) => item.ruptureTimeS === undefined);
  return {
    fire: {
      basis: fire.basis,
      initialFluxWPerM2: fire.fluxWPerM2(summary.initialTemperatureK),
      ...(fire.fixedFluxWPerM2 === undefined ? {} : { fixedFluxWPerM2: fire.fixedFluxWPerM2 }),
    },
    strengthFraction,
    horizonS,
    shutInPressurePa,
    items: judged,
    depressurisationWins,
    verdict: worstOf(judged.map((item) => item.verdict)),
    sentence: governing ? sentence(governing) : "",
  };
}

function look(
  item: Item,
  setting: Setting,
  tensileStrengthPa: number | undefined,
  targetTimeS: number | undefined,
): SteelInFireItem {
  const rule: StrengthRule = {
    strengthFraction: setting.strengthFraction,
    tensileStrengthPa: tensileStrengthPa ?? item.steel.tensileStrengthPa,
  };
  const blownDown = follow(item, setting, rule, { fluxFactor: 1, untilS: setting.horizonS });
  const hotter = follow(item, setting, rule, { fluxFactor: moreFlux, untilS: setting.horizonS });
  const shutIn = follow(item, setting, rule, {
    fluxFactor: 1,
    untilS: Math.max(setting.horizonS, shutInHorizonS),
    heldPressurePa: setting.shutInPressurePa,
  });
  const optional = <K extends string>(key: K, value: number | undefined) =>
    value === undefined ? {} : ({ [key]: value } as Record<K, number>);
  const { leastRatio, leastRatioTimeS } = leastOf(blownDown);
  const early = hotter.ruptureTimeS !== undefined && hotter.ruptureTimeS < (targetTimeS ?? setting.horizonS);
  const verdict: Verdict = leastRatio <= 1 || early ? "beyond" : leastRatio < nearRatio ? "near" : "within";
  const { timeS, wallTemperatureK } = blownDown;
  return {
    id: item.id,
    name: item.name,
    steel: item.steel.id,
    part: item.part,
    insideDiameterM: item.insideDiameterM,
    thicknessM: item.thicknessM,
    leastRatio,
    leastRatioTimeS,
    hottestWallK: Math.max(...wallTemperatureK),
    ...optional("ruptureTimeS", blownDown.ruptureTimeS),
    ...optional("ruptureTimeAtMoreFluxS", hotter.ruptureTimeS),
    ...optional("ruptureTimeShutInS", shutIn.ruptureTimeS),
    ...optional(
      "timeTo400CelsiusS",
      timeS.find((_, i) => (wallTemperatureK[i] ?? 0) >= softeningK),
    ),
    verdict,
    governs: false,
    series: thinned(blownDown),
  };
}

const worstOf = (verdicts: Verdict[]): Verdict =>
  (["beyond", "open", "near"] as const).find((one) => verdicts.includes(one)) ?? "within";

function sentence({ name, leastRatio, ruptureTimeS }: SteelInFireItem): string {
  if (ruptureTimeS !== undefined)
    return `${name}: the fire takes the strength faster than the blowdown lowers the stress. It ruptures after about ${(ruptureTimeS / 60).toPrecision(2)} min.`;
  return `${name}: the blowdown keeps the stress below the hot strength, at worst by a factor of ${(Math.floor(leastRatio * 100) / 100).toPrecision(2)}.`;
}
