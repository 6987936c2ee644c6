import {
  hammerschmidtDepression,
  hydrateFlagTemperature,
  motieeHydrateTemperature,
  towlerMokhatabHydrateTemperature,
} from "../../solids/hydrate";
import { carbonDioxideSublimationPressure, iceSublimationPressure, waterSaturationPressure } from "../../solids/solid-lines";
import { exemptionCurves, exemptTemperatureK, thickestM } from "../../steels/exemption-curves";
import { gives, number, oneOf } from "../field";
import { defineMethod } from "../method";

const pressurePa = gives("p", "Pressure", "Pa");

export const carbonDioxideSublimation = defineMethod({
  id: "cold-carbon-dioxide-sublimation",
  chapter: "cold",
  title: "Sublimation pressure of carbon dioxide",
  source: "Span and Wagner 1996",
  formula: String.raw`\ln\frac{p}{p_t}=\frac{T_t}{T}\left[-14.740846(1-\theta)+2.4327015(1-\theta)^{1.9}-5.3061778(1-\theta)^{2.9}\right],\ \theta=\frac{T}{T_t}`,
  inputs: { temperatureK: number("T", "Temperature", "K", { min: 100, max: 216.592 }) },
  outputs: { pressurePa },
  cautions: [
    "Solid carbon dioxide may plug the outlet; the predicted fall of pressure may stall, and warming releases trapped pressure.",
  ],
  evaluate: ({ temperatureK }) => ({ pressurePa: carbonDioxideSublimationPressure(temperatureK) }),
});

export const waterSaturation = defineMethod({
  id: "cold-water-saturation",
  chapter: "cold",
  title: "Saturation pressure of water",
  source: "Wagner and Pruss, IAPWS SR1-86(1992)",
  formula: String.raw`\ln\frac{p}{22.064\,\text{MPa}}=\frac{T_c}{T}\sum_i a_i\,\tau^{n_i},\qquad \tau=1-\frac{T}{647.096}`,
  inputs: { temperatureK: number("T", "Temperature", "K", { min: 273.16, max: 647.096 }) },
  outputs: { pressurePa },
  evaluate: ({ temperatureK }) => ({ pressurePa: waterSaturationPressure(temperatureK) }),
});

export const iceSublimation = defineMethod({
  id: "cold-ice-sublimation",
  chapter: "cold",
  title: "Sublimation pressure of ice",
  source: "IAPWS R14-08",
  formula: String.raw`\ln\frac{p}{611.657\,\text{Pa}}=\frac{1}{\theta}\sum_i a_i\,\theta^{b_i},\qquad \theta=\frac{T}{273.16}`,
  inputs: { temperatureK: number("T", "Temperature", "K", { min: 50, max: 273.16 }) },
  outputs: { pressurePa },
  evaluate: ({ temperatureK }) => ({ pressurePa: iceSublimationPressure(temperatureK) }),
});

export const hydrate = defineMethod({
  id: "cold-hydrate-temperature",
  chapter: "cold",
  title: "Hydrate temperature of a sweet natural gas",
  source: "Motiee 1991; Towler and Mokhatab 2005; a margin of 3 K on the higher (policy, ours)",
  formula: String.raw`T[^\circ\mathrm{F}]=13.47\ln p+34.27\ln\gamma-1.675\ln p\,\ln\gamma-20.35`,
  inputs: {
    pressurePa: number("p", "Pressure, absolute", "Pa", { above: 0, max: 1e9 }),
    gasGravity: number("\\gamma", "Molar mass over that of air", "", { min: 0.3, max: 2 }),
  },
  outputs: {
    motieeK: gives("T_M", "By Motiee", "K"),
    towlerMokhatabK: gives("T_{TM}", "By Towler and Mokhatab", "K"),
    flagBelowK: gives("T_f", "The higher with its margin", "K"),
  },
  bounds: [
    { words: "Gas gravity from 0.55 to 1.0.", holds: ({ gasGravity }) => gasGravity >= 0.55 && gasGravity <= 1 },
    { words: "Temperature from 260 to 298 K.", holds: (_, { towlerMokhatabK: T }) => T >= 260 && T <= 298 },
  ],
  cautions: ["Hydrogen sulfide or carbon dioxide above a few per cent raises the temperature; that is not in it."],
  evaluate: ({ pressurePa: p, gasGravity }) => ({
    motieeK: motieeHydrateTemperature(p, gasGravity),
    towlerMokhatabK: towlerMokhatabHydrateTemperature(p, gasGravity),
    flagBelowK: hydrateFlagTemperature(p, gasGravity),
  }),
});

export const inhibitor = defineMethod({
  id: "cold-hydrate-inhibitor",
  chapter: "cold",
  title: "Depression of the hydrate temperature by an inhibitor",
  source: "Hammerschmidt 1939; 1297 K is methanol's constant",
  formula: String.raw`\Delta T=\frac{K_H\,w}{M\,(100-w)}`,
  inputs: {
    massFraction: number("w/100", "Mass fraction of the inhibitor in the water", "", { min: 0, max: 0.4 }),
    molarMassKgPerMol: number("M", "Molar mass of the inhibitor", "kg/mol", { above: 0, max: 0.5 }),
    constantK: number("K_H", "Constant of the inhibitor", "K", { above: 0, max: 1e4, default: 1297 }),
  },
  outputs: { depressionK: gives("\\Delta T", "Depression", "K") },
  bounds: [{ words: "At most 25 % methanol or 40 % glycol by mass.", holds: ({ massFraction }) => massFraction <= 0.25 }],
  evaluate: ({ massFraction, molarMassKgPerMol, constantK }) => ({
    depressionK: hammerschmidtDepression(massFraction * 100, molarMassKgPerMol * 1000, constantK),
  }),
});

export const impactExemption = defineMethod({
  id: "cold-impact-exemption",
  chapter: "cold",
  title: "Impact-test exemption temperature of carbon and low-alloy steel",
  source: "ASME VIII-1 figure UCS-66, polynomial form of ASME VIII-2 and API 579-1",
  formula: String.raw`T_A=\frac{-76.911+284.85\,t-27.560\,t^2}{1+1.7971\,t-0.17887\,t^2}\ (t\ \text{in inches},\ ^\circ\mathrm{F}),\ \ldots`,
  inputs: {
    curve: oneOf("Curve of the steel", exemptionCurves),
    thicknessM: number("t", "Governing thickness", "m", { above: 0, max: thickestM }),
  },
  outputs: { temperatureK: gives("T", "Lowest exempt metal temperature", "K") },
  cautions: [
    "A positive margin is not an approval. Minimum design temperature, impact testing and stress reduction are decided under the vessel code by a competent person.",
  ],
  evaluate: ({ curve, thicknessM }) => ({ temperatureK: exemptTemperatureK(curve, thicknessM) }),
});
