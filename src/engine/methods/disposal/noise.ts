import {
  addLevelsDb,
  chartIntensityDb,
  levelAt30mDb,
  levelAtDistanceDb,
  soundSpeedMPerS,
  steepBelowRatio,
} from "../../disposal/noise";
import { gives, number, numbers } from "../field";
import { defineMethod } from "../method";

export const noiseCaution =
  "Noise is a single-point estimate for open air; valve and pipe noise are not included. Exposure limits are set by the site.";

export const ventNoise = defineMethod({
  id: "disposal-vent-noise",
  chapter: "disposal",
  title: "Noise of a vent in the open",
  source: "API Std 521; chart as digitised in an open fluid library, 3 dB added below a pressure ratio of 3 (policy, ours)",
  formula: String.raw`c=91.2\sqrt{\frac{k\,T}{M}},\quad L_{30}=L_{chart}\!\left(\frac{p_1}{p_2}\right)+10\log_{10}\frac{W c^2}{2},\quad L_r=L_{30}-20\log_{10}\frac{r}{30}`,
  inputs: {
    massFlowKgPerS: number("W", "Mass flow", "kg/s", { above: 0, max: 1e5 }),
    heatCapacityRatio: number("k", "Heat capacity ratio", "", { above: 1, max: 2 }),
    temperatureK: number("T", "Temperature of the gas", "K", { above: 0, max: 3000 }),
    molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { above: 0, max: 1 }),
    pressureRatio: number("p_1/p_2", "Pressure upstream over downstream, absolute", "", { above: 1, max: 1e4, default: 3 }),
    chartDb: number("L_{chart}", "Level read from the chart; from the fit where it is left out", "dB", {
      min: 0,
      max: 100,
      optional: true,
    }),
    distanceM: number("r", "Distance", "m", { above: 0, max: 1e5, default: 30 }),
  },
  outputs: {
    soundSpeedMPerS: gives("c", "Speed of sound", "m/s"),
    chartDb: gives("L_{chart}", "Level of the chart", "dB"),
    levelAt30mDb: gives("L_{30}", "Level at 30 m", "dB"),
    levelDb: gives("L_r", "Level at the distance", "dB"),
  },
  bounds: [
    {
      words: `Pressure ratio at least ${steepBelowRatio}: below, the chart is too steep to read and 3 dB are added.`,
      holds: ({ pressureRatio }) => pressureRatio >= steepBelowRatio,
    },
  ],
  cautions: [noiseCaution],
  evaluate: (given) => {
    const { heatCapacityRatio, temperatureK, molarMassKgPerMol, pressureRatio, distanceM } = given;
    const chartDb = given.chartDb ?? chartIntensityDb(pressureRatio);
    const at30 = levelAt30mDb({ ...given, chartDb });
    return {
      soundSpeedMPerS: soundSpeedMPerS(heatCapacityRatio, temperatureK, molarMassKgPerMol),
      chartDb,
      levelAt30mDb: at30,
      levelDb: levelAtDistanceDb(at30, distanceM),
    };
  },
});

export const addedNoise = defineMethod({
  id: "disposal-noise-sum",
  chapter: "disposal",
  title: "Several sources of noise added",
  source: "Sum of sound powers, by definition of the level",
  formula: String.raw`L=10\log_{10}\sum_i 10^{L_i/10}`,
  inputs: { levelsDb: numbers("L_i", "Levels at the receptor", "dB", { min: -100, max: 250 }) },
  outputs: { levelDb: gives("L", "Level of all", "dB") },
  cautions: [noiseCaution],
  evaluate: ({ levelsDb }) => ({ levelDb: addLevelsDb(levelsDb) }),
});
