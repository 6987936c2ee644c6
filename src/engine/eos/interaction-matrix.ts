import type { FluidSpec } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import { libraryInteraction, type InteractionFamily } from "../substances/interaction";
import { librarySubstance, findLibraryRow } from "../substances/library";
import type { Substance } from "../substances/substance";

/** k_ij of every pair of a fluid (row-major, symmetric, zero diagonal), and what a reader must know about them. */
export function interactionMatrix(
  fluid: FluidSpec,
  substances: readonly Substance[],
  family: InteractionFamily | undefined,
): { kij: Float64Array; notes: string[] } {
  const count = substances.length;
  const kij = new Float64Array(count * count);
  const notes: string[] = [];
  const set = (i: number, j: number, value: number) => {
    kij[i * count + j] = value;
    kij[j * count + i] = value;
  };
  const interaction = fluid.interaction ?? "library";
  if (interaction === "none" || count === 1) return { kij, notes };

  if (interaction === "library") {
    if (!family) {
      notes.push("No published interaction parameters belong to this equation: all kij are zero.");
      return { kij, notes };
    }
    let silent = 0;
    for (let i = 0; i < count; i++) {
      for (let j = 0; j < i; j++) {
        const found = libraryInteraction(stand(substances[i]!), stand(substances[j]!), family);
        if (found) set(i, j, found.kij);
        else silent++;
      }
    }
    if (silent > 0)
      notes.push(`The interaction table is silent on ${silent} of ${(count * (count - 1)) / 2} pairs: their kij are zero.`);
    if (substances.some((substance) => substance.origin === "pseudo")) {
      notes.push("Interaction parameters of a pseudo-component are those of the normal alkane nearest in molar mass.");
    }
    return { kij, notes };
  }

  const indexOf = new Map(substances.map((substance, index) => [substance.id, index]));
  interaction.forEach(({ pair, kij: value }, row) => {
    const path = `fluid.interaction[${row}]`;
    const i = indexOf.get(pair[0]);
    const j = indexOf.get(pair[1]);
    if (i === undefined || j === undefined || i === j) {
      throw new EngineError("invalid-case", "a pair must name two different components of the fluid", {}, `${path}.pair`);
    }
    if (!(value > -1 && value < 1)) {
      throw new EngineError("invalid-case", "kij must lie between -1 and 1", { kij: value }, `${path}.kij`);
    }
    set(i, j, value);
  });
  return { kij, notes };
}

const alkaneLadder = ["n_hexane", "n_heptane", "n_octane", "n_nonane", "n_decane", "n_undecane", "n_dodecane"].map((id) =>
  librarySubstance(findLibraryRow(id)!),
);

/** The library id whose interaction parameters a component uses. */
function stand(substance: Substance): string {
  if (substance.origin !== "pseudo") return substance.id;
  const distance = (alkane: Substance) => Math.abs(alkane.molarMassKgPerMol - substance.molarMassKgPerMol);
  return alkaneLadder.reduce((best, alkane) => (distance(alkane) < distance(best) ? alkane : best)).id;
}
