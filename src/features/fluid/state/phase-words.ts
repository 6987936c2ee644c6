import type { PhaseKind } from "@/engine/flash/equilibrium";

export const phaseWords: Record<PhaseKind, string> = {
  vapour: "Vapour",
  liquid: "Liquid",
  supercritical: "Supercritical",
};

/** "Vapour", or "Two phases, 93.4 % vapour by mole". */
export function stateWords({
  phase,
  vapourMoleFraction,
}: {
  phase: PhaseKind | "two-phase";
  vapourMoleFraction: number;
}): string {
  if (phase !== "two-phase") return phaseWords[phase];
  const percent = vapourMoleFraction * 100;
  const figure = percent < 0.05 ? "below 0.1" : percent > 99.95 ? "above 99.9" : percent.toFixed(1);
  return `Two phases, ${figure}\u00a0% vapour by mole`;
}
