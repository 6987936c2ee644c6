/** What no single line can know: lines of a draft held against each other, each trouble cited at the line to change. */
import type { DraftDocument } from "./draft";
import { targetPressure, valuesOf } from "./draft-assemble";
import { liquidAtStart, shapeGeometry } from "./draft-geometry";
import type { LineProblem, SiteFacts } from "./draft-to-case";
import type { LineNo } from "./lines/line";
import { lineByNo, lineKey } from "./lines/registry";

export function crossProblems(draft: DraftDocument, letter: string, site: SiteFacts): LineProblem[] {
  const { asked, choice, si } = valuesOf(draft, letter);
  const found: LineProblem[] = [];
  const say = (no: LineNo, message: string) => found.push({ line: lineKey(lineByNo(no), letter), message });

  const start = si("2.09");
  if (start !== undefined) {
    const below = (value: number | undefined) => value === undefined || value < start;
    if (!below(si("5.04"))) say("5.04", "The back pressure must be below the pressure at start, line 2.09.");
    if (!below(si("7.11"))) say("7.11", "The run must end below the pressure at start, line 2.09.");
    if (!below(targetPressure(si, site)))
      say("7.09", "The target pressure is not below the pressure at start, line 2.09. Set a lower target here.");
    if (!below(si("5.10"))) say("5.10", "The pressure to be reached must be below the pressure at start, line 2.09.");
  }
  const reached = choice("5.01") === "sized" ? (si("5.10") ?? targetPressure(si, site)) : undefined;
  if (reached !== undefined && reached <= (si("5.04") ?? 0))
    say("5.10", "The pressure to be reached must be above the back pressure, line 5.04.");

  const [set, reseat] = [si("5.13"), si("5.14")];
  if (set !== undefined && reseat !== undefined && reseat >= set)
    say("5.14", "The device must reseat below its set pressure, line 5.13.");

  const geometry = shapeGeometry(draft);
  const bore = si("5.02");
  if (geometry && bore !== undefined && bore > geometry.largestBoreM)
    say("5.02", "The bore is larger than the vessel. Check figure and unit.");
  if (geometry && asked("2.07") && !liquidAtStart(draft, geometry))
    say("2.07", "The level stands above the top of the vessel. Check it against line 2.04.");
  if (choice("2.02") === "volume" && choice("6.02") === "pool-fire")
    say(
      "6.02",
      "A pool fire heats the wetted surface, which a plain volume does not tell. Give the shape on line 2.02, or choose a constant heat.",
    );
  return found;
}
