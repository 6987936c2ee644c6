import { valveGasFlow } from "../../flow/control-valve";
import { idealBlowdownTimes, idealMassFlux } from "../../flow/ideal-gas-flow";
import { gives, givesWord, number } from "../field";
import { defineMethod } from "../method";

const gas = {
  molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { above: 0, max: 1 }),
  heatCapacityRatio: number("k", "Heat capacity ratio of the ideal gas", "", { above: 1, max: 2 }),
  compressibility: number("Z", "Compressibility factor", "", { above: 0, max: 5, default: 1 }),
  temperatureK: number("T_0", "Temperature at rest", "K", { above: 0, max: 3000 }),
} as const;
const idealCaution = "Ideal-gas formula: 3 to 8 % from the real gas at high pressure, more near saturation.";

export const idealFlux = defineMethod({
  id: "discharge-ideal-gas-flux",
  chapter: "discharge",
  title: "Mass flux of an ideal gas through a nozzle",
  source: "Isentropic flow of an ideal gas, with Z on the density",
  formula: String.raw`G=p_0\sqrt{\frac{k\,M}{Z\,R\,T_0}}\left(\frac{2}{k+1}\right)^{\frac{k+1}{2(k-1)}}\ \text{choked};\quad G=p_0\sqrt{\frac{2M}{ZRT_0}\frac{k}{k-1}\left[r^{2/k}-r^{(k+1)/k}\right]}`,
  inputs: {
    ...gas,
    pressurePa: number("p_0", "Pressure at rest, absolute", "Pa", { above: 0, max: 1e9 }),
    backPressurePa: number("p_2", "Back pressure, absolute", "Pa", { min: 0, max: 1e9, default: 101325 }),
  },
  outputs: { massFluxKgPerM2S: gives("G", "Mass flux", "kg/(m² s)"), flow: givesWord("Whether it chokes") },
  bounds: [
    {
      words: "Back pressure below the pressure at rest.",
      holds: ({ backPressurePa, pressurePa }) => backPressurePa < pressurePa,
    },
  ],
  cautions: [idealCaution],
  evaluate: (given) => {
    const { massFluxKgPerM2S, choked } = idealMassFlux(
      given,
      given.pressurePa,
      given.temperatureK,
      Math.min(given.backPressurePa, given.pressurePa),
    );
    return { massFluxKgPerM2S, flow: choked ? "choked" : "subcritical" };
  },
});

export const idealBlowdown = defineMethod({
  id: "discharge-ideal-gas-blowdown-time",
  chapter: "discharge",
  title: "Time to blow down an ideal gas through a choked orifice",
  source: "Closed forms of the mass balance, adiabatic and isothermal",
  formula: String.raw`\frac{p}{p_0}=\left[1+\frac{k-1}{2}\frac{t}{\tau}\right]^{-\frac{2k}{k-1}}\ \text{adiabatic},\quad \frac{p}{p_0}=e^{-t/\tau}\ \text{isothermal},\quad \tau=\frac{m_0}{W_0}`,
  inputs: {
    ...gas,
    volumeM3: number("V", "Volume", "m³", { above: 0, max: 1e6 }),
    orificeDiameterM: number("d", "Orifice diameter", "m", { above: 0, max: 10 }),
    dischargeCoefficient: number("C_d", "Discharge coefficient", "", { above: 0, max: 1 }),
    startPressurePa: number("p_0", "Pressure at start, absolute", "Pa", { above: 0, max: 1e9 }),
    endPressurePa: number("p_1", "Pressure to reach, absolute", "Pa", { above: 0, max: 1e9 }),
  },
  outputs: {
    timeConstantS: gives("\\tau", "Mass at start over first rate", "s"),
    adiabaticS: gives("t_{ad}", "Time without heat", "s"),
    isothermalS: gives("t_{is}", "Time at constant temperature", "s"),
    adiabaticEndK: gives("T_1", "Temperature at the end without heat", "K"),
  },
  bounds: [
    { words: "End pressure below the start.", holds: ({ startPressurePa, endPressurePa }) => endPressurePa < startPressurePa },
  ],
  cautions: [idealCaution],
  evaluate: ({ orificeDiameterM, molarMassKgPerMol, heatCapacityRatio, compressibility, ...rest }) =>
    idealBlowdownTimes({
      ...rest,
      gas: { molarMassKgPerMol, heatCapacityRatio, compressibility },
      orificeAreaM2: (Math.PI / 4) * orificeDiameterM ** 2,
    }),
});

const cvPerKv = 1.156;

export const valveGas = defineMethod({
  id: "discharge-valve-gas",
  chapter: "discharge",
  title: "Gas through a control valve",
  source: "IEC 60534-2-1, gas, without fittings",
  formula: String.raw`W=N_6\,C\,Y\sqrt{x\,p_1\,\rho_1},\quad Y=1-\frac{x}{3F_\gamma x_T},\quad x=\min\!\left(\frac{p_1-p_2}{p_1},F_\gamma x_T\right),\quad F_\gamma=\frac{\gamma}{1.4}`,
  inputs: {
    cv: number("C_v", "Flow coefficient", "", { above: 0, max: 1e6 }),
    xt: number("x_T", "Pressure ratio factor of the valve", "", { above: 0, max: 1 }),
    upstreamPressurePa: number("p_1", "Pressure upstream, absolute", "Pa", { above: 0, max: 1e9 }),
    downstreamPressurePa: number("p_2", "Pressure downstream, absolute", "Pa", { min: 0, max: 1e9 }),
    densityKgPerM3: number("\\rho_1", "Density upstream", "kg/m³", { above: 0, max: 5e3 }),
    gamma: number("\\gamma", "Heat capacity ratio of the ideal gas", "", { above: 1, max: 2 }),
  },
  outputs: {
    massFlowKgPerS: gives("W", "Mass flow", "kg/s"),
    kvM3PerH: gives("K_v", "The same coefficient as K_v", "m³/h"),
    flow: givesWord("Whether it chokes"),
  },
  evaluate: (given) => {
    const { massFlowKgPerS, choked } = valveGasFlow(given);
    return { massFlowKgPerS, kvM3PerH: given.cv / cvPerKv, flow: choked ? "choked" : "subcritical" };
  },
});
