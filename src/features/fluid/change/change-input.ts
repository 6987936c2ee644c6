/** What a change of state rests on, as it is typed: composition, equation, two states. As text of an address, and as a case document. */
import { molePercentOf } from "@/contracts/derive-si";
import type { CompositionRow } from "@/contracts/draft";
import { componentList } from "@/contracts/component-list";
import { compositionSlackPercent } from "@/contracts/draft-to-case";
import type { UnitSystem } from "@/components/units/unit-system";
import { equationIds, type EquationId, type FluidSpec } from "@/engine/cases/fluid-spec";
import type { PathCase, StatePoint } from "@/engine/cases/path-case";
import { stateFromText, stateToText } from "../keep/state-text";
import { emptyState, readState, typedState, type TypedState } from "../state/typed";

export type ChangeInput = {
  rows: CompositionRow[];
  /** The person has chosen to scale a sum that is not 100. */
  normalised: boolean;
  equation: EquationId;
  interaction: "library" | "none";
  from: TypedState;
  to: TypedState;
};

export const emptyChange = (system: UnitSystem): ChangeInput => ({
  rows: [],
  normalised: false,
  equation: "peng-robinson-1976",
  interaction: "library",
  from: emptyState(system),
  to: emptyState(system),
});

/** A fluid that is known, from a state that is known. */
export function changeOfFluid(
  { components, equation, interaction }: FluidSpec,
  from: StatePoint | undefined,
  system: UnitSystem,
): ChangeInput {
  const empty = emptyChange(system);
  return {
    ...empty,
    rows: components.map(({ id, moleFraction }) => {
      const typed = String(Number((moleFraction * 100).toPrecision(9)));
      return { id, typed, molePercent: molePercentOf(typed) };
    }),
    normalised: true,
    equation,
    interaction: interaction === "none" ? "none" : "library",
    from: from ? typedState(from, system) : empty.from,
  };
}

const known = new Set(componentList.map(({ id }) => id));

export function changeToText({ rows, normalised, equation, interaction, from, to }: ChangeInput): string {
  const query = new URLSearchParams({
    z: rows.map(({ id, typed }) => `${id}~${typed}`).join("|"),
    eq: equation,
    kij: interaction,
    from: stateToText(from),
    to: stateToText(to),
  });
  if (normalised) query.set("scaled", "1");
  return query.toString();
}

/** Nothing where the text is not such an address. Components that the library does not know are left out. */
export function changeFromText(text: string): ChangeInput | null {
  const query = new URLSearchParams(text);
  const equation = equationIds.find((id) => id === query.get("eq"));
  const [from, to] = [stateFromText(query.get("from") ?? ""), stateFromText(query.get("to") ?? "")];
  if (!equation || !from || !to) return null;
  const rows = (query.get("z") ?? "").split("|").flatMap((part): CompositionRow[] => {
    const at = part.indexOf("~");
    const [id, typed] = [part.slice(0, Math.max(at, 0)), part.slice(at + 1).slice(0, 40)];
    return known.has(id) ? [{ id, typed, molePercent: molePercentOf(typed) }] : [];
  });
  const once = rows.filter((row, at) => rows.findIndex(({ id }) => id === row.id) === at).slice(0, 50);
  return {
    rows: once,
    normalised: query.get("scaled") === "1",
    equation,
    interaction: query.get("kij") === "none" ? "none" : "library",
    from,
    to,
  };
}

export const sumOf = (rows: readonly CompositionRow[]): number =>
  rows.reduce((sum, { molePercent }) => sum + (molePercent ?? 0), 0);

/** What stands in the way of a composition, in words; nothing where it can be used. */
export function compositionProblem({ rows, normalised }: Pick<ChangeInput, "rows" | "normalised">): string | undefined {
  const bad = rows.find(({ molePercent }) => molePercent === null);
  if (bad) return bad.typed.trim() === "" ? "An amount is missing." : `“${bad.typed}” is no amount. Type mol %, for example 4.5.`;
  const sum = sumOf(rows);
  if (rows.length === 0 || sum === 0) return "Add the components and their amounts.";
  if (Math.abs(sum - 100) > compositionSlackPercent)
    return `The amounts sum to ${sum.toFixed(3)} mol %, too far from 100 to scale. Check for a missing row or a wrong decimal.`;
  if (Math.abs(sum - 100) > 1e-4 && !normalised)
    return `The amounts sum to ${sum.toFixed(3)} mol %. Correct them, or choose “Normalise”.`;
  return undefined;
}

export function fluidOfInput(input: ChangeInput): FluidSpec | undefined {
  if (compositionProblem(input)) return undefined;
  const sum = sumOf(input.rows);
  return {
    components: input.rows.flatMap(({ id, molePercent }) => (molePercent ? [{ id, moleFraction: molePercent / sum }] : [])),
    equation: input.equation,
    interaction: input.interaction,
  };
}

/** The case document, as the command line takes it; nothing while a part of it can't be read. */
export function caseOfInput(input: ChangeInput, barometricPressurePa: number): PathCase | undefined {
  const fluid = fluidOfInput(input);
  const [from, to] = [readState(input.from, barometricPressurePa), readState(input.to, barometricPressurePa)];
  if (!fluid || !from || !to) return undefined;
  return { format: "ebbmark-case/1", kind: "path", fluid, from, to };
}
