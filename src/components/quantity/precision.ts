import type { QuantityId } from "@/engine/units";

/**
 * How exactly a quantity is shown: at least `figures` significant figures and at least `decimals` decimals, and never coarser than whole
 * units. So 6.9 bar(g) reads 6.90, 84 reads 84.0 and 1218.3 psig reads 1218.
 */
export type Precision = { figures?: number; decimals?: number };

type Rules = { usual: Precision } & Record<string, Precision>;

const three: Rules = { usual: { figures: 3 } };
const four: Rules = { usual: { figures: 4 } };

const rules: Record<QuantityId, Rules> = {
  pressure: three,
  pressureDifference: three,
  temperature: { usual: { decimals: 1 } },
  temperatureDifference: { usual: { decimals: 1 } },
  length: {
    usual: { figures: 3 },
    mm: { decimals: 1 },
    cm: { decimals: 2 },
    m: { decimals: 3 },
    in: { decimals: 3 },
    ft: { decimals: 2 },
  },
  area: { usual: { figures: 3 }, "mm²": {} },
  volume: four,
  mass: three,
  massRate: three,
  massFlux: three,
  power: three,
  energy: { usual: { figures: 3, decimals: 1 }, J: {} },
  molarEnergy: four,
  molarEntropy: four,
  specificEnergy: { usual: { decimals: 1 } },
  heatFlux: three,
  filmCoefficient: three,
  conductivity: three,
  specificHeat: four,
  time: { usual: { decimals: 1 }, h: { decimals: 2 } },
  density: four,
  molarVolume: four,
  molarMass: { usual: { decimals: 2 } },
  speed: three,
  viscosity: three,
  surfaceTension: three,
  jouleThomson: three,
  flowCoefficient: three,
  fraction: { usual: { figures: 3 }, "%": {} },
};

export const precisionOf = (quantity: QuantityId, unit: string): Precision => rules[quantity][unit] ?? rules[quantity].usual;

/** Decimals that a value needs under a precision; zero needs none. */
export function decimalsFor(value: number, { figures, decimals = 0 }: Precision): number {
  if (figures === undefined || value === 0 || !Number.isFinite(value)) return decimals;
  const needed = (x: number) => Math.max(decimals, figures - 1 - Math.floor(Math.log10(Math.abs(x))), 0);
  // Rounding may add a digit in front (9.996 to 10.0), and then one decimal less is right.
  const rounded = Number(value.toFixed(Math.min(needed(value), 100)));
  return Math.min(rounded === 0 ? needed(value) : needed(rounded), 100);
}
