import { fragmentCaution } from "../../cautions";
import { fixedDistanceM, pressureTestEnergyJ, testDistanceM, tntJPerKg } from "../../energy/pressure-test";
import { availabilityEnergyJ, brodeEnergyJ, isentropicEnergyJ, isothermalEnergyJ } from "../../energy/stored-energy";
import { EngineError } from "../../errors";
import { gives, number } from "../field";
import { defineMethod } from "../method";

const vessel = {
  pressurePa: number("p_1", "Pressure in the vessel, absolute", "Pa", { above: 0, max: 1e9 }),
  surroundingsPa: number("p_0", "Pressure of the surroundings, absolute", "Pa", { above: 0, max: 1e8, default: 101325 }),
  volumeM3: number("V", "Volume of gas", "m³", { above: 0, max: 1e7 }),
} as const;
const heatCapacityRatio = number("k", "Ideal-gas heat capacity ratio", "", { above: 1, max: 2 });
const energyJ = gives("E", "Energy", "J");

function aboveSurroundings<G extends { pressurePa: number; surroundingsPa: number }>(given: G): G {
  if (given.pressurePa > given.surroundingsPa) return given;
  throw new EngineError(
    "invalid-case",
    `The pressure in the vessel must be above its surroundings, ${given.surroundingsPa} Pa.`,
    {},
    "inputs.pressurePa",
  );
}

export const brode = defineMethod({
  id: "energy-brode",
  chapter: "energy",
  title: "Energy of a gas-filled vessel, heat added at constant volume",
  source: "Brode 1959",
  formula: String.raw`E=\frac{(p_1-p_0)\,V}{k-1}`,
  inputs: { ...vessel, heatCapacityRatio },
  outputs: { energyJ },
  cautions: [fragmentCaution],
  evaluate: (given) => ({ energyJ: brodeEnergyJ(aboveSurroundings(given), given.heatCapacityRatio) }),
});

export const isentropic = defineMethod({
  id: "energy-isentropic-ideal",
  chapter: "energy",
  title: "Energy of a gas-filled vessel, isentropic expansion of an ideal gas",
  source: "Baker et al.",
  formula: String.raw`E=\frac{p_1 V}{k-1}\left[1-\left(\frac{p_0}{p_1}\right)^{\frac{k-1}{k}}\right]`,
  inputs: { ...vessel, heatCapacityRatio },
  outputs: { energyJ },
  cautions: [fragmentCaution],
  evaluate: (given) => ({ energyJ: isentropicEnergyJ(aboveSurroundings(given), given.heatCapacityRatio) }),
});

export const isothermal = defineMethod({
  id: "energy-isothermal",
  chapter: "energy",
  title: "Energy of a gas-filled vessel, isothermal expansion",
  source: "Smith and Van Ness",
  formula: String.raw`E=p_1 V\ln\frac{p_1}{p_0}`,
  inputs: vessel,
  outputs: { energyJ },
  cautions: [fragmentCaution],
  evaluate: (given) => ({ energyJ: isothermalEnergyJ(aboveSurroundings(given)) }),
});

export const availability = defineMethod({
  id: "energy-availability",
  chapter: "energy",
  title: "Energy of a gas-filled vessel, thermodynamic availability",
  source: "Crowl 1992",
  formula: String.raw`E=p_1 V\left[\ln\frac{p_1}{p_0}-\left(1-\frac{p_0}{p_1}\right)\right]`,
  inputs: vessel,
  outputs: { energyJ },
  cautions: [fragmentCaution],
  evaluate: (given) => ({ energyJ: availabilityEnergyJ(aboveSurroundings(given)) }),
});

export const pressureTest = defineMethod({
  id: "energy-pressure-test",
  chapter: "energy",
  title: "Stored energy and stand-off of a pneumatic pressure test",
  source: "ASME PCC-2 article 501; distance with the factor 2, the larger of the forms in print",
  formula: String.raw`E=2.5\,p_t V\left[1-\left(\frac{p_a}{p_t}\right)^{0.286}\right],\quad W_{TNT}=\frac{E}{4\,266\,920},\quad R=R_{scaled}\,(2\,W_{TNT})^{1/3}`,
  inputs: {
    testPressurePa: number("p_t", "Test pressure, absolute", "Pa", { above: 101_000, max: 1e9 }),
    volumeM3: number("V", "Volume under test", "m³", { above: 0, max: 1e7 }),
    scaledDistance: number("R_{scaled}", "Scaled distance; 20 is the article's least", "m/kg^(1/3)", {
      above: 0,
      max: 1e3,
      default: 20,
    }),
  },
  outputs: {
    energyJ,
    tntKg: gives("W_{TNT}", "Equivalent TNT", "kg"),
    distanceByFormulaM: gives("R", "Distance by the formula", "m"),
    fixedDistanceM: gives("R_{fix}", "Fixed distance for this energy; 0 above 271 MJ", "m"),
    standOffM: gives("R_{min}", "Stand-off: the greater of the two", "m"),
  },
  bounds: [
    {
      words: "Energy at most 271 MJ: above, the distance is by the formula alone and the article asks to split the test.",
      holds: (_, { energyJ: energy }) => energy <= 271e6,
    },
    { words: "Scaled distance at least 20, the article's least.", holds: ({ scaledDistance }) => scaledDistance >= 20 },
  ],
  cautions: [fragmentCaution],
  evaluate: ({ testPressurePa, volumeM3, scaledDistance }) => {
    const energy = pressureTestEnergyJ(testPressurePa, volumeM3);
    const tntKg = energy / tntJPerKg;
    const [byFormula, fixed] = [testDistanceM(tntKg, scaledDistance), fixedDistanceM(energy)];
    return {
      energyJ: energy,
      tntKg,
      distanceByFormulaM: byFormula,
      fixedDistanceM: fixed,
      standOffM: Math.max(byFormula, fixed),
    };
  },
});

export const tntEquivalent = defineMethod({
  id: "energy-tnt-equivalent",
  chapter: "energy",
  title: "Equivalent charge of TNT",
  source: "By definition; 4.266920 MJ/kg is ASME PCC-2's, elsewhere 4.184 to 4.61 are used",
  formula: String.raw`W_{TNT}=\frac{\eta\,E}{e_{TNT}}`,
  inputs: {
    energyJ: number("E", "Energy", "J", { above: 0, max: 1e15 }),
    blastFraction: number("\\eta", "Fraction of the energy that becomes blast", "", { above: 0, max: 1, default: 1 }),
    energyOfTntJPerKg: number("e_{TNT}", "Energy of TNT", "J/kg", { min: 4e6, max: 5e6, default: tntJPerKg }),
  },
  outputs: { tntKg: gives("W_{TNT}", "Equivalent TNT", "kg") },
  cautions: [fragmentCaution],
  evaluate: ({ energyJ: energy, blastFraction, energyOfTntJPerKg }) => ({ tntKg: (blastFraction * energy) / energyOfTntJPerKg }),
});
