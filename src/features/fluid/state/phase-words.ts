import type { PhaseKind } from "@/engine/flash/equilibrium";

const words: Record<PhaseKind, string> = { vapour: "Vapour", liquid: "Liquid", supercritical: "Supercritical" };

type NamedPhase = { kind: PhaseKind; aqueous: boolean };

/** A name for each phase of a state: liquid water is called so, and of two other liquids the denser is the second. */
export function phaseNames(phases: readonly NamedPhase[]): string[] {
  let liquids = 0;
  return phases.map(({ kind, aqueous }) => {
    if (aqueous) return "Water";
    if (kind !== "liquid") return words[kind];
    liquids += 1;
    return liquids > 1 ? "Second liquid" : words.liquid;
  });
}

type Described = { phase: PhaseKind | "two-phase"; vapourMoleFraction: number; phases?: readonly NamedPhase[] };

/** "Vapour", or "Vapour and liquid, 93.4 % vapour by mole". Where the phases are not listed, liquid may be more than one. */
export function stateWords({ phase, vapourMoleFraction, phases }: Described): string {
  if (phase !== "two-phase") return words[phase];
  if (!(vapourMoleFraction > 0)) return phases ? listed(phaseNames(phases)) : "Two liquids";
  return `${phases ? listed(phaseNames(phases)) : "Vapour and liquid"}, ${vapourShare(vapourMoleFraction)} vapour by mole`;
}

/** The same for a column of a table whose head says that shares are by mole. */
export function briefStateWords({ phase, vapourMoleFraction }: Described): string {
  if (phase !== "two-phase") return words[phase];
  return vapourMoleFraction > 0 ? `${vapourShare(vapourMoleFraction)} vapour` : "Two liquids";
}

function vapourShare(vapourMoleFraction: number): string {
  const percent = vapourMoleFraction * 100;
  const figure = percent < 0.05 ? "below 0.1" : percent > 99.95 ? "above 99.9" : percent.toFixed(1);
  return `${figure}\u00a0%`;
}

function listed(names: readonly string[]): string {
  const [first = "", ...rest] = names;
  const others = rest.map((name) => name.toLowerCase());
  return others.length < 2
    ? [first, ...others].join(" and ")
    : `${[first, ...others.slice(0, -1)].join(", ")} and ${others.at(-1) ?? ""}`;
}
