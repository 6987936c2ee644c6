import { chokedOutletPressurePa, frictionFactor, inletPressurePa, machAt } from "../../disposal/pipe-flow";
import { gives, givesWord, number } from "../field";
import { defineMethod } from "../method";

const gas = {
  massFlowKgPerS: number("W", "Mass flow", "kg/s", { above: 0, max: 1e5 }),
  diameterM: number("d", "Inside diameter", "m", { above: 0, max: 20 }),
  temperatureK: number("T", "Temperature", "K", { above: 0, max: 3000 }),
  molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { above: 0, max: 1 }),
  compressibility: number("Z", "Compressibility factor", "", { above: 0, max: 5, default: 1 }),
} as const;
const isothermalLimit = {
  words: "Isothermal Mach number at the outlet at most 0.7.",
  holds: (_: unknown, { outletMachIsothermal }: { outletMachIsothermal: number }) => outletMachIsothermal <= 0.7,
};

export const outletMach = defineMethod({
  id: "disposal-pipe-mach",
  chapter: "disposal",
  title: "Mach number at the outlet of a vent pipe",
  source: "API Std 521; with the exact constant of the units instead of the rounded 3.23e-5",
  formula: String.raw`Ma_2=\frac{W}{p_2\,\frac{\pi}{4}d^2}\sqrt{\frac{Z\,R\,T}{k\,M}}`,
  inputs: {
    ...gas,
    outletPressurePa: number("p_2", "Pressure at the outlet, absolute", "Pa", { above: 0, max: 1e9 }),
    heatCapacityRatio: number("k", "Heat capacity ratio", "", { above: 1, max: 2 }),
  },
  outputs: { mach: gives("Ma_2", "Mach number", "") },
  bounds: [
    {
      words: "Mach number at most 1: above, the pipe is choked and the outlet pressure is higher than given.",
      holds: (_, { mach }) => mach <= 1,
    },
  ],
  evaluate: (given) => ({ mach: machAt(given, given.outletPressurePa, given.heatCapacityRatio) }),
});

export const headerInlet = defineMethod({
  id: "disposal-pipe-inlet-pressure",
  chapter: "disposal",
  title: "Pressure at the inlet of a vent pipe or header, isothermal",
  source: "API Std 521, isothermal compressible flow",
  formula: String.raw`\frac{f L}{d}+K=\frac{1}{Ma_{2i}^2}\left(\frac{p_1}{p_2}\right)^2\left[1-\left(\frac{p_2}{p_1}\right)^2\right]-2\ln\frac{p_1}{p_2}`,
  inputs: {
    ...gas,
    outletPressurePa: number("p_2", "Pressure at the outlet, absolute", "Pa", { above: 0, max: 1e9 }),
    lengthM: number("L", "Length", "m", { min: 0, max: 1e6 }),
    darcyFrictionFactor: number("f", "Friction factor, Darcy", "", { above: 0, max: 1 }),
    fittingsCoefficient: number("K", "Loss coefficient of fittings", "", { min: 0, max: 1e5, default: 0 }),
  },
  outputs: {
    inletPressurePa: gives("p_1", "Pressure at the inlet, absolute", "Pa"),
    outletPressureInPipePa: gives("p_2", "Pressure just inside the outlet, absolute", "Pa"),
    outletMachIsothermal: gives("Ma_{2i}", "Isothermal Mach number at the outlet", ""),
    flow: givesWord("Whether the outlet chokes"),
  },
  bounds: [isothermalLimit],
  cautions: ["Two-phase flow in the pipe is outside this form."],
  evaluate: ({ lengthM, darcyFrictionFactor, fittingsCoefficient, outletPressurePa, ...pipe }) => {
    const resistance = (darcyFrictionFactor * lengthM) / pipe.diameterM + fittingsCoefficient;
    const { inletPa, outletPa, choked } = inletPressurePa(pipe, outletPressurePa, resistance);
    return {
      inletPressurePa: inletPa,
      outletPressureInPipePa: outletPa,
      outletMachIsothermal: choked ? 1 : machAt(pipe, outletPa, 1),
      flow: choked ? "choked" : "subsonic",
    };
  },
});

export const friction = defineMethod({
  id: "disposal-friction-factor",
  chapter: "disposal",
  title: "Friction factor of a pipe, Darcy",
  source: "Colebrook 1939; 64/Re in laminar flow",
  formula: String.raw`\frac{1}{\sqrt f}=-2\log_{10}\left(\frac{\varepsilon}{3.7\,d}+\frac{2.51}{Re\sqrt f}\right)`,
  inputs: {
    reynolds: number("Re", "Reynolds number", "", { above: 0, max: 1e12 }),
    roughnessM: number("\\varepsilon", "Roughness: 45 µm clean, 150 to 500 µm old steel", "m", {
      min: 0,
      max: 0.05,
      default: 4.5e-5,
    }),
    diameterM: gas.diameterM,
  },
  outputs: { frictionFactor: gives("f", "Friction factor, Darcy", "") },
  bounds: [
    {
      words: "Reynolds number below 2300 or above 4000: in between the flow may be either.",
      holds: ({ reynolds }) => reynolds <= 2300 || reynolds >= 4000,
    },
  ],
  evaluate: ({ reynolds, roughnessM, diameterM }) => ({ frictionFactor: frictionFactor(reynolds, roughnessM / diameterM) }),
});

export const chokedPressure = defineMethod({
  id: "disposal-choked-outlet-pressure",
  chapter: "disposal",
  title: "Least pressure at the outlet of a vent pipe",
  source: "Isothermal limit of compressible pipe flow",
  formula: String.raw`p_{2,min}=\frac{W}{\frac{\pi}{4}d^2}\sqrt{\frac{Z\,R\,T}{M}}`,
  inputs: gas,
  outputs: { outletPressurePa: gives("p_{2,min}", "Pressure at which the outlet is at its isothermal limit", "Pa") },
  evaluate: (given) => ({ outletPressurePa: chokedOutletPressurePa(given) }),
});
