/** What has to be said beside a phase diagram: where a line stops, which lines are missing and why, what the path does. */
import type { PhaseEnvelope } from "@/engine/flash/phase-envelope";
import type { DiagramInput, RunPath } from "./phase-curves";

type Write = { temperature: (si: number) => string; pressure: (si: number) => string };

export function diagramNotes({ envelope, lines, pure, wet, path }: DiagramInput, write: Write): string[] {
  const notes: string[] = [];
  const ended = envelope && endNote(envelope, pure, write);
  if (ended) notes.push(ended);
  if (envelope && wet)
    notes.push(
      "The lines follow one new phase. With water in the composition, liquid water can stand outside them: the table of properties finds it.",
    );
  if (path) notes.push(pathNote(path));
  if (lines?.hydrate) {
    notes.push(
      `The hydrate line is the higher of two correlations on gas gravity with ${lines.hydrate.marginK} K added, for a sweet gas with free water. It is a screening.`,
    );
  }
  if (lines?.withoutHydrate) notes.push(lines.withoutHydrate);
  if (lines && lines.solidCarbonDioxide.length > 1)
    notes.push("Left of the CO2 line solid carbon dioxide can form. The fusion line above the triple temperature is not drawn.");
  return notes;
}

function endNote({ points, endedBy }: PhaseEnvelope, pure: boolean, { temperature, pressure }: Write): string | undefined {
  const last = points.at(-1);
  if (pure || !last) return undefined;
  const where = `${pressure(last.pressurePa)}, ${temperature(last.temperatureK)}`;
  switch (endedBy) {
    case "low-pressure":
      return undefined;
    case "high-pressure":
      return `The envelope is open: the trace was followed to ${where}.`;
    case "cold":
      return `The trace was followed down to ${where}.`;
    case "lost":
    case "points":
      return `The trace ends at ${where}: the next point was not found. What lies beyond is not shown; it is not one phase for that reason.`;
  }
}

/** Share of vapour along a run; a path on the far side of a critical point is one fluid all the way. */
function pathNote({ vapourMoleFraction }: RunPath): string {
  const inside = vapourMoleFraction.filter((share) => share > 1e-6 && share < 1 - 1e-6);
  if (inside.length === 0) return "Along the blowdown path the fluid stays one phase.";
  const least = Math.min(...inside);
  return `The blowdown path runs through two phases; the least vapour share on it is ${shareWords(least)}, by mole.`;
}

const shareWords = (share: number): string => (share < 0.001 ? "below 0.1\u00a0%" : `${(share * 100).toPrecision(3)}\u00a0%`);

/** The finding of the diagram in one sentence, for those who listen. */
export function diagramSummary({ envelope, pure, start, path }: DiagramInput, write: Write): string {
  if (!envelope) return "Phase diagram without its envelope.";
  const at = (point: { temperatureK: number; pressurePa: number }) =>
    `${write.pressure(point.pressurePa)}, ${write.temperature(point.temperatureK)}`;
  const head = envelope.critical
    ? `${pure ? "Vapour pressure" : "Bubble and dew line"} up to the critical point at ${at(envelope.critical)}`
    : "Phase envelope without a critical point";
  return `${head}${start ? `; the blowdown starts at ${at(start)}` : ""}. ${path ? pathNote(path) : ""}`.trim();
}
