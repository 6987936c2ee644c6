import { fragmentCaution } from "../../cautions";
import { freeAirOverpressurePa, surfaceOverpressurePa, surfaceScaledDistance, surfaceScaledDistances } from "../../energy/blast";
import { gives, number } from "../field";
import { defineMethod } from "../method";

const nearField = {
  words: "Scaled distance at least 4: nearer, a point charge over-predicts what a bursting vessel does (from memory).",
  holds: (_: unknown, { scaledDistance }: { scaledDistance: number }) => scaledDistance >= 4,
};
const place = {
  distanceM: number("R", "Distance", "m", { above: 0, max: 1e6 }),
  tntKg: number("W", "Equivalent TNT", "kg", { above: 0, max: 1e9 }),
} as const;

export const freeAir = defineMethod({
  id: "blast-free-air",
  chapter: "energy",
  title: "Overpressure of a burst in free air",
  source: "Kinney and Graham 1985, free-air curve",
  formula: String.raw`\frac{p}{p_a}=\frac{808\left[1+(Z/4.5)^2\right]}{\sqrt{1+(Z/0.048)^2}\sqrt{1+(Z/0.32)^2}\sqrt{1+(Z/1.35)^2}},\qquad Z=\frac{R}{(f\,W)^{1/3}}`,
  inputs: {
    ...place,
    groundFactor: number("f", "Factor on the charge: 1 in the air, 1.8 on the ground", "", { min: 1, max: 2, default: 1 }),
  },
  outputs: {
    overpressurePa: gives("p", "Side-on overpressure", "Pa"),
    scaledDistance: gives("Z", "Scaled distance", "m/kg^(1/3)"),
  },
  bounds: [nearField],
  cautions: [fragmentCaution],
  evaluate: ({ distanceM, tntKg, groundFactor }) => {
    const scaledDistance = distanceM / Math.cbrt(groundFactor * tntKg);
    return { overpressurePa: freeAirOverpressurePa(scaledDistance), scaledDistance };
  },
});

export const surface = defineMethod({
  id: "blast-surface",
  chapter: "energy",
  title: "Overpressure of a burst on the ground",
  source: "Swisdak 1994, simplified Kingery and Bulmash curves, hemispherical charge",
  formula: String.raw`p=\exp\sum_i c_i(\ln Z)^i\ \text{kPa},\qquad Z=\frac{R}{W^{1/3}}`,
  inputs: place,
  outputs: {
    overpressurePa: gives("p", "Side-on overpressure", "Pa"),
    scaledDistance: gives("Z", "Scaled distance", "m/kg^(1/3)"),
  },
  bounds: [nearField],
  cautions: [fragmentCaution],
  evaluate: ({ distanceM, tntKg }) => {
    const scaledDistance = distanceM / Math.cbrt(tntKg);
    return { overpressurePa: surfaceOverpressurePa(scaledDistance), scaledDistance };
  },
});

export const surfaceDistance = defineMethod({
  id: "blast-surface-distance",
  chapter: "energy",
  title: "Distance for an overpressure, burst on the ground",
  source: "Swisdak 1994, simplified Kingery and Bulmash curves, solved for the distance",
  formula: String.raw`R=Z(p)\,W^{1/3}`,
  inputs: { overpressurePa: number("p", "Side-on overpressure", "Pa", { above: 0, max: 1e9 }), tntKg: place.tntKg },
  outputs: {
    distanceM: gives("R", "Distance", "m"),
    scaledDistance: gives("Z", "Scaled distance", "m/kg^(1/3)"),
  },
  bounds: [
    nearField,
    {
      words: "Scaled distance from 0.2 to 198.5, the range of the curves.",
      holds: (_, { scaledDistance }) =>
        scaledDistance >= surfaceScaledDistances.from && scaledDistance <= surfaceScaledDistances.to,
    },
  ],
  cautions: [fragmentCaution],
  evaluate: ({ overpressurePa, tntKg }) => {
    const scaledDistance = surfaceScaledDistance(overpressurePa);
    return { distanceM: scaledDistance * Math.cbrt(tntKg), scaledDistance };
  },
});
