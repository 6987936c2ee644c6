/** The figure that governs a run, as short words for the bar on phones and for readers by ear. */
import type { AssessedLimit, BlowdownResult, LimitId } from "@/engine/cases/blowdown-result";
import type { QuantityId } from "@/engine/units";

export type Shown = (quantity: QuantityId, si: number) => { text: string };

const names: Record<LimitId, string> = {
  "time-to-target": "to target pressure",
  "minimum-wall-temperature": "wall",
  "minimum-outlet-temperature": "fluid leaving",
  "peak-vent-rate": "vent load",
  "minimum-liquid-wall-temperature": "liquid-wetted wall",
  solids: "to solid in the vessel",
  "solids-behind-opening": "to solid behind the opening",
  hydrate: "to hydrate",
  "liquid-carry-over": "swelled liquid",
  "least-strength-ratio": "hot strength over stress",
};

const quantities: Record<AssessedLimit["unit"], { value: QuantityId; difference: QuantityId }> = {
  K: { value: "temperature", difference: "temperatureDifference" },
  s: { value: "time", difference: "time" },
  "kg/s": { value: "massRate", difference: "massRate" },
  "1": { value: "fraction", difference: "fraction" },
};

/**
 * shown     writes an SI value in the unit in use
 * Returns   the figure and what it is, with what is in hand; the lowest fluid temperature where no limit governs
 */
export function governingFigure(
  { limits, summary }: Pick<BlowdownResult, "limits" | "summary">,
  shown: Shown,
): { figure: string; words: string } {
  const governing = limits.find(({ governs, value }) => governs && value !== undefined);
  if (governing?.value === undefined) {
    return { figure: shown("temperature", summary.minimumFluidTemperatureK).text, words: "lowest fluid" };
  }
  const { value: plain, difference } = quantities[governing.unit];
  const value = governing.difference ? difference : plain;
  // Where the target was not reached the engine gives the end of the run, so that the line can be judged; it is no arrival.
  const reached = governing.id !== "time-to-target" || summary.timeToTargetPressureS !== undefined;
  const { inHand } = governing;
  const left =
    inHand === undefined
      ? ""
      : inHand < 0
        ? `, ${shown(difference, -inHand).text} past the limit`
        : `, ${shown(difference, inHand).text} in hand`;
  return reached
    ? { figure: shown(value, governing.value).text, words: `${names[governing.id]}${left}` }
    : { figure: "not reached", words: "target pressure" };
}
