import type { ComponentSpec, FluidSpec, PairInteraction, PlusFraction } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import { pseudoSubstance } from "./pseudo-component";

/** Molar mass at which a C7+ fraction begins where none is given [kg/mol]: that of the lightest heptanes and of benzene's cut, rounded. */
export const lightestOfC7PlusKgPerMol = 0.09;
const usualPieces = 3;
const mostPieces = 8;

export interface PlusPiece {
  /** Part of the moles of the fraction. */
  share: number;
  molarMassKgPerMol: number;
  relativeDensity: number;
}

/**
 * A heavy fraction known by its mean molar mass and relative density, cut into pieces of equal mass.
 *
 *   p(M) = exp[−(M − η)/β]/β,  β = M₊ − η         mole distribution over molar mass from η upwards
 *   Q(y) = [η (1 − e⁻ʸ) + β (1 − (1 + y) e⁻ʸ)]/M₊  mass below M = η + β y
 *   SG_i = C M_i^0.17947                           constant Watson factor, C such that Σ z_i M_i/SG_i = M₊/SG₊
 *
 * Source   Whitson, SPE J. 23 (1983) 683-694: three-parameter gamma distribution, here with shape 1 (exponential), and the exponent of the
 *          Watson factor by molar mass; equal masses a piece as Pedersen, Thomassen and Fredenslund, Ind. Eng. Chem. Process Des. Dev. 24
 *          (1985) 948.
 * Returns  pieces, lightest first; moles, mass and volume of the whole are kept exactly
 * Checks   plus-fraction.test.ts
 */
export function splitPlusFraction({
  molarMassKgPerMol: mean,
  relativeDensity,
  pieces = usualPieces,
  lightestMolarMassKgPerMol: lightest = lightestOfC7PlusKgPerMol,
}: PlusFraction): PlusPiece[] {
  if (!(Number.isInteger(pieces) && pieces >= 1 && pieces <= mostPieces)) {
    throw new EngineError("invalid-case", `a plus fraction is cut into 1 to ${mostPieces} pieces`, { pieces }, "pieces");
  }
  if (!(lightest > 0.05 && mean > lightest * 1.02)) {
    throw new EngineError(
      "invalid-case",
      "the mean molar mass of a plus fraction must lie at least 2 % above that of its lightest part (0.090 kg/mol unless given)",
      { molarMassKgPerMol: mean, lightestMolarMassKgPerMol: lightest },
      "molarMassKgPerMol",
    );
  }
  const scale = mean - lightest;
  const moles = (y: number) => -Math.expm1(-y);
  const mass = (y: number) => (lightest * moles(y) + scale * (1 - (1 + y) * Math.exp(-y))) / mean;
  const ends = Array.from({ length: pieces - 1 }, (_, k) => inverse(mass, (k + 1) / pieces));
  const cuts = [0, ...ends, Infinity];
  const shares = cuts.slice(1).map((end, k) => (end === Infinity ? 1 : moles(end)) - moles(cuts[k]!));
  const masses = shares.map((share) => mean / pieces / share);
  const watson = (relativeDensity * shares.reduce((sum, share, k) => sum + share * masses[k]! ** (1 - watsonExponent), 0)) / mean;
  return shares.map((share, k) => ({
    share,
    molarMassKgPerMol: masses[k]!,
    relativeDensity: watson * masses[k]! ** watsonExponent,
  }));
}

/** SG ∝ M^0.17947 at one Watson factor. */
const watsonExponent = 0.17947;

/** y at which a rising function from 0 to 1 reaches a share. */
function inverse(rising: (y: number) => number, share: number): number {
  let low = 0;
  let high = 60;
  for (let k = 0; k < 100; k++) {
    const middle = 0.5 * (low + high);
    if (rising(middle) < share) low = middle;
    else high = middle;
  }
  return 0.5 * (low + high);
}

/**
 * The fluid with every plus fraction replaced by its pieces, as pseudo-components `<id>-1`, `<id>-2`, …; a fluid without one is returned as it
 * is. An interaction stated for the fraction holds for each piece.
 */
export function expandPlusFractions(fluid: FluidSpec): FluidSpec {
  if (!fluid.components.some(({ plus }) => plus)) return fluid;
  const names = new Map<string, string[]>();
  const components = fluid.components.flatMap((component, index): ComponentSpec[] => {
    const { id, moleFraction, plus, pseudo, custom } = component;
    if (!plus) return [component];
    const path = `fluid.components[${index}]`;
    if (pseudo || custom) {
      throw new EngineError("invalid-case", "give one of plus, pseudo and custom for a component", {}, path);
    }
    let pieces: PlusPiece[];
    try {
      pieces = splitPlusFraction(plus);
      for (const piece of pieces) pseudoSubstance(id, piece.molarMassKgPerMol, piece.relativeDensity); // within its correlations?
    } catch (error) {
      throw error instanceof EngineError ? error.at(error.path ? `${path}.plus.${error.path}` : `${path}.plus`) : error;
    }
    names.set(
      id,
      pieces.map((_, k) => `${id}-${k + 1}`),
    );
    return pieces.map(({ share, molarMassKgPerMol, relativeDensity }, k) => ({
      id: `${id}-${k + 1}`,
      moleFraction: moleFraction * share,
      pseudo: { molarMassKgPerMol, relativeDensity },
    }));
  });
  const { interaction } = fluid;
  if (interaction === undefined || typeof interaction === "string") return { ...fluid, components };
  const namesOf = (id: string) => names.get(id) ?? [id];
  const pairs = interaction.flatMap(({ pair: [a, b], kij }) =>
    namesOf(a).flatMap((one) => namesOf(b).map((two): PairInteraction => ({ pair: [one, two], kij }))),
  );
  return { ...fluid, components, interaction: pairs };
}
