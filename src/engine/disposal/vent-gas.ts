/** Quality of the gas that a vent or flare receives. */
import { EngineError } from "../errors";
import { findLibraryRow } from "../substances/library";

/**
 * Net calorific values at 25 °C [kJ/mol], as in ISO 6976. The first eight are re-derived from open enthalpies of formation within 0.02 %;
 * the others are from memory: the standard's superior value less 44.016 kJ for each mole of water formed.
 */
const netCalorificKJPerMol: Readonly<Record<string, number>> = {
  methane: 802.6,
  ethane: 1428.6,
  propane: 2043.1,
  n_butane: 2657.3,
  n_pentane: 3271.8,
  hydrogen: 241.8,
  carbon_monoxide: 283.0,
  hydrogen_sulfide: 518.0,
  isobutane: 2648.1,
  isopentane: 3264.7,
  neopentane: 3250.5,
  n_hexane: 3886.8,
  n_heptane: 4501.3,
  n_octane: 5115.7,
  n_nonane: 5731.0,
  n_decane: 6345.6,
  cyclopentane: 3099.5,
  cyclohexane: 3688.9,
  methylcyclohexane: 4292.5,
  ethylene: 1323.1,
  propylene: 1926.0,
  "1_butene": 2540.8,
  "1_3_butadiene": 2408.7,
  benzene: 3169.4,
  toluene: 3771.8,
  ethylbenzene: 4387.1,
  o_xylene: 4376.2,
  methanol: 676.1,
  nitrogen: 0,
  carbon_dioxide: 0,
  oxygen: 0,
  argon: 0,
  helium: 0,
  water: 0,
};
export const ventGasIds = Object.keys(netCalorificKJPerMol);

/** Mean molar mass [kg/mol] and net calorific value per kilogram [J/kg]. */
export function ventGasQuality(composition: Readonly<Record<string, number>>): {
  molarMassKgPerMol: number;
  netCalorificJPerKg: number;
} {
  let mass = 0;
  let heat = 0;
  for (const [id, fraction] of Object.entries(composition)) {
    if (fraction === 0) continue;
    const value = netCalorificKJPerMol[id];
    const row = findLibraryRow(id);
    if (value === undefined || !row)
      throw new EngineError("not-applicable", `No net calorific value is held for "${id}". Known are ${ventGasIds.join(", ")}.`, {
        id,
      });
    mass += fraction * row.molarMass_kg_per_mol;
    heat += fraction * value * 1e3;
  }
  return { molarMassKgPerMol: mass, netCalorificJPerKg: heat / mass };
}
