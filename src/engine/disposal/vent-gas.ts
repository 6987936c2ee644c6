/** Quality of the gas that a vent or flare receives. */
import { EngineError } from "../errors";
import { findLibraryRow } from "../substances/library";

/** Library components that give no heat; any other without a value is refused. */
const inert = new Set([
  "nitrogen",
  "oxygen",
  "argon",
  "helium",
  "carbon_dioxide",
  "water",
  "sulfur_dioxide",
  "chlorine",
  "hydrogen_chloride",
]);

/** Mean molar mass [kg/mol] and net calorific value at 25 °C per kilogram [J/kg], from the library's own values and their sources. */
export function ventGasQuality(composition: Readonly<Record<string, number>>): {
  molarMassKgPerMol: number;
  netCalorificJPerKg: number;
} {
  let mass = 0;
  let heat = 0;
  for (const [id, fraction] of Object.entries(composition)) {
    if (fraction === 0) continue;
    const row = findLibraryRow(id);
    const value = row && (row.lowerHeatingValue_J_per_mol ?? (inert.has(id) ? 0 : undefined));
    if (value === undefined) {
      throw new EngineError(
        "not-applicable",
        row ? `No net calorific value is held for "${id}".` : `"${id}" is no component of the library.`,
        { id },
        `inputs.composition.${id}`,
      );
    }
    mass += fraction * row!.molarMass_kg_per_mol; // a value is there, so the row is
    heat += fraction * value;
  }
  return { molarMassKgPerMol: mass, netCalorificJPerKg: heat / mass };
}
