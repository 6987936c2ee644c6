import { distanceForRadiationM, flameLengthM, radiationAtWPerM2, transmissivity } from "../../disposal/radiation";
import { gives, number } from "../field";
import { defineMethod } from "../method";

export const flameCaution =
  "Wind, flame tilt, soot and structure shielding are not modelled; receptors below the flame centre or downwind can see more than shown.";

const flame = {
  heatReleaseW: number("Q", "Heat released by the flame", "W", { above: 0, max: 1e13 }),
  radiatedFraction: number("F", "Fraction radiated", "", { above: 0, max: 1 }),
  transmissivity: number("\\tau", "Transmissivity of the air", "", { above: 0, max: 1, default: 1 }),
} as const;

export const radiationDistance = defineMethod({
  id: "disposal-radiation-distance",
  chapter: "disposal",
  title: "Distance for a heat flux from a flame",
  source: "API Std 521, point source",
  formula: String.raw`D=\sqrt{\frac{\tau\,F\,Q}{4\pi K}}`,
  inputs: { ...flame, fluxWPerM2: number("K", "Allowed heat flux", "W/m²", { above: 0, max: 1e6 }) },
  outputs: { distanceM: gives("D", "Distance from the flame's centre", "m") },
  cautions: [flameCaution, "Solar heat of 0.8 to 1.0 kW/m² is not in the flux unless it was subtracted from the allowed one."],
  evaluate: ({ heatReleaseW, radiatedFraction, transmissivity: tau, fluxWPerM2 }) => ({
    distanceM: distanceForRadiationM(heatReleaseW, radiatedFraction, tau, fluxWPerM2),
  }),
});

export const radiation = defineMethod({
  id: "disposal-radiation",
  chapter: "disposal",
  title: "Heat flux at a distance from a flame",
  source: "API Std 521, point source",
  formula: String.raw`K=\frac{\tau\,F\,Q}{4\pi D^2}`,
  inputs: { ...flame, distanceM: number("D", "Distance from the flame's centre", "m", { above: 0, max: 1e5 }) },
  outputs: { fluxWPerM2: gives("K", "Heat flux", "W/m²") },
  cautions: [flameCaution],
  evaluate: ({ heatReleaseW, radiatedFraction, transmissivity: tau, distanceM }) => ({
    fluxWPerM2: radiationAtWPerM2(heatReleaseW, radiatedFraction, tau, distanceM),
  }),
});

export const airTransmissivity = defineMethod({
  id: "disposal-transmissivity",
  chapter: "disposal",
  title: "Transmissivity of humid air",
  source: "API Std 521",
  formula: String.raw`\tau=0.79\left(\frac{100}{RH}\right)^{1/16}\left(\frac{30.5}{D}\right)^{1/16}`,
  inputs: {
    relativeHumidity: number("RH/100", "Relative humidity, as a fraction", "", { above: 0, max: 1 }),
    distanceM: number("D", "Distance", "m", { above: 0, max: 1e5 }),
  },
  outputs: { transmissivity: gives("\\tau", "Transmissivity", "") },
  bounds: [
    {
      words: "Distance from 30 to 150 m, relative humidity above 10 %, smokeless flame.",
      holds: ({ distanceM, relativeHumidity }) => distanceM >= 30 && distanceM <= 150 && relativeHumidity > 0.1,
    },
  ],
  evaluate: ({ relativeHumidity, distanceM }) => ({ transmissivity: transmissivity(relativeHumidity, distanceM) }),
});

export const flameLength = defineMethod({
  id: "disposal-flame-length",
  chapter: "disposal",
  title: "Length of a flare's flame",
  source: "Straight-line fit of the chart of API Std 521",
  formula: String.raw`L=0.00331\,Q^{0.4776}`,
  inputs: { heatReleaseW: flame.heatReleaseW },
  outputs: { lengthM: gives("L", "Flame length", "m") },
  cautions: [flameCaution],
  evaluate: ({ heatReleaseW }) => ({ lengthM: flameLengthM(heatReleaseW) }),
});
