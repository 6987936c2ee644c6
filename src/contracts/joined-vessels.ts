/**
 * Writes out what `vessels` stands for: one `vessel` with the volumes, areas and steel of all, and a start in which they have settled.
 *
 * A document that was written out before is accepted again where its `vessel` says the same, so that a stored case stays as it is.
 */
import type { BlowdownCase, SectionPart, StartSpec } from "@/engine/cases/blowdown-case";
import { EngineError } from "@/engine/errors";
import { joinVessels } from "@/engine/start/join-vessels";

type Vessel = BlowdownCase["vessel"];
type Written<Given> = Omit<Given, "vessel" | "start"> & { vessel: Vessel; start: StartSpec };
type Problem = { path: (string | number)[]; message: string };

export function withVesselsJoined<Given extends { vessel?: Vessel; vessels?: SectionPart[]; start?: StartSpec }>(
  given: Given,
): { document?: Written<Given>; problems: Problem[] } {
  const { vessel, vessels, start } = given;
  if (!vessels) {
    const missing = (path: string, message: string): Problem => ({ path: [path], message });
    const problems = [
      ...(vessel ? [] : [missing("vessel", "This is missing. Give a vessel, or the list of vessels that are joined.")]),
      ...(start ? [] : [missing("start", "This is missing. Give an object.")]),
      ...(start && "settleOut" in start
        ? [missing("vessels", "There is nothing to settle out. List the vessels that are joined.")]
        : []),
    ];
    return vessel && start && problems.length === 0 ? { document: { ...given, vessel, start }, problems } : { problems };
  }
  if (start && !("settleOut" in start)) {
    return {
      problems: [
        {
          path: ["start"],
          message: 'Each of the vessels has its own start. Give { "settleOut": "adiabatic" } or leave this out.',
        },
      ],
    };
  }
  try {
    const joined = joinVessels(vessels);
    if (vessel && !saysTheSame(vessel, joined)) {
      return { problems: [{ path: ["vessel"], message: "This says something else than the list of vessels. Remove it." }] };
    }
    return { document: { ...given, vessel: vessel ?? joined, start: start ?? { settleOut: "adiabatic" } }, problems: [] };
  } catch (error) {
    if (!(error instanceof EngineError)) throw error;
    return { problems: [{ path: pathParts(error.path ?? "vessels"), message: error.message }] };
  }
}

/** Equal, but for rounding in the last digits of a number. */
function saysTheSame(a: unknown, b: unknown): boolean {
  if (typeof a === "number" && typeof b === "number") return Math.abs(a - b) <= 1e-9 * Math.abs(b);
  if (typeof a !== "object" || typeof b !== "object" || a === null || b === null) return a === b;
  const [left, right] = [a as Record<string, unknown>, b as Record<string, unknown>];
  const keys = new Set([...Object.keys(left), ...Object.keys(right)]);
  return [...keys].every((key) => saysTheSame(left[key], right[key]));
}

/** `vessels[1].wall` as its parts. */
const pathParts = (path: string): (string | number)[] =>
  [...path.matchAll(/([^.[\]]+)|\[(\d+)\]/g)].map(([, key, index]) => key ?? Number(index));
