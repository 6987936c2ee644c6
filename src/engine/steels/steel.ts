/**
 * Wall materials: density, specific heat, conductivity and typical rated temperature, from the table beside this file (sources in it).
 *
 * Tables are linear between points and hold their end value outside; `inRange` says whether a temperature lies on the table.
 */
import table from "./steels.json";

export const steelIds = [
  "carbon_steel",
  "carbon_steel_lt",
  "nickel_3_5",
  "nickel_9",
  "ss304",
  "ss316",
  "duplex2205",
  "al5083",
] as const;
export type SteelId = (typeof steelIds)[number];

export const isSteelId = (id: string): id is SteelId => steelIds.some((known) => known === id);

export type Steel = {
  id: SteelId;
  name: string;
  densityKgPerM3: number;
  typicalMinimumDesignMetalTemperatureK: number;
  sources: Readonly<Record<string, string>>;
  specificHeatRangeK: readonly [number, number];
  specificHeatJPerKgK: (temperatureK: number) => number;
  conductivityWPerMK: (temperatureK: number) => number;
  /** At 20 °C, the least of typical grades [Pa]. */
  tensileStrengthPa: number;
  /**
   * Hot strength over that at 20 °C. For carbon and nickel steels the published factor is that of the yield at 2 % strain, used as a proxy;
   * for stainless steel and aluminium that of the tensile strength.
   */
  strengthRatio: (temperatureK: number) => number;
  /** ∫ c dT from the first point of the table [J/kg]; the exact integral of the broken line. */
  heatContentJPerKg: (temperatureK: number) => number;
  /** The inverse of `heatContentJPerKg`. */
  temperatureFromHeatContentK: (heatContentJPerKg: number) => number;
};

const made = new Map<SteelId, Steel>();

export function steelById(id: SteelId): Steel {
  const known = made.get(id);
  if (known) return known;
  const row = table.materials.find((material) => material.id === id);
  if (!row) throw new RangeError(`there is no steel ${id}`);
  const heat = new BrokenLine(row.specificHeat_J_per_kgK);
  const conductivity = new BrokenLine(row.thermalConductivity_W_per_mK);
  const strength = new BrokenLine(row.strengthVersusTemperature.yieldRatio_ky ?? row.strengthVersusTemperature.ultimateRatio);
  const steel: Steel = {
    id,
    name: row.name,
    densityKgPerM3: row.density_kg_per_m3,
    typicalMinimumDesignMetalTemperatureK: row.minimumDesignMetalTemperature.typical_K,
    sources: row.sources as Readonly<Record<string, string>>,
    specificHeatRangeK: heat.range,
    specificHeatJPerKgK: (T) => heat.at(T),
    conductivityWPerMK: (T) => conductivity.at(T),
    tensileStrengthPa: row.ultimateTensileStrength20C_MPa * 1e6,
    strengthRatio: (T) => strength.at(T),
    heatContentJPerKg: (T) => heat.integralTo(T),
    temperatureFromHeatContentK: (q) => heat.whereIntegralIs(q),
  };
  made.set(id, steel);
  return steel;
}

/** y(x) linear between points and constant outside, with its integral from the first point and the inverse of that. */
class BrokenLine {
  readonly range: readonly [number, number];
  private readonly x: number[];
  private readonly y: number[];
  private readonly area: number[];

  constructor(points: readonly (readonly number[])[]) {
    this.x = points.map((point) => point[0] ?? Number.NaN);
    this.y = points.map((point) => point[1] ?? Number.NaN);
    this.area = [0];
    for (let i = 1; i < this.x.length; i++)
      this.area.push(
        this.n(this.area, i - 1) +
          ((this.n(this.y, i) + this.n(this.y, i - 1)) / 2) * (this.n(this.x, i) - this.n(this.x, i - 1)),
      );
    this.range = [this.n(this.x, 0), this.n(this.x, this.x.length - 1)];
  }

  at(x: number): number {
    const i = this.piece(this.x, x);
    const [x0, x1] = [this.n(this.x, i), this.n(this.x, i + 1)];
    const part = Math.min(Math.max((x - x0) / (x1 - x0), 0), 1);
    return this.n(this.y, i) * (1 - part) + this.n(this.y, i + 1) * part;
  }

  integralTo(x: number): number {
    const [first, last] = this.range;
    if (x <= first) return (x - first) * this.n(this.y, 0);
    if (x >= last) return this.n(this.area, this.area.length - 1) + (x - last) * this.n(this.y, this.y.length - 1);
    const i = this.piece(this.x, x);
    return this.n(this.area, i) + ((this.n(this.y, i) + this.at(x)) / 2) * (x - this.n(this.x, i));
  }

  whereIntegralIs(q: number): number {
    const [first, last] = this.range;
    const whole = this.n(this.area, this.area.length - 1);
    if (q <= 0) return first + q / this.n(this.y, 0);
    if (q >= whole) return last + (q - whole) / this.n(this.y, this.y.length - 1);
    const i = this.piece(this.area, q);
    const y0 = this.n(this.y, i);
    const slope = (this.n(this.y, i + 1) - y0) / (this.n(this.x, i + 1) - this.n(this.x, i));
    const rest = q - this.n(this.area, i);
    // y0 d + slope d²/2 = rest, in the form that loses nothing when the slope is small.
    return this.n(this.x, i) + (2 * rest) / (y0 + Math.sqrt(y0 * y0 + 2 * slope * rest));
  }

  private piece(knots: number[], value: number): number {
    let i = 0;
    while (i < knots.length - 2 && value > this.n(knots, i + 1)) i++;
    return i;
  }

  private n(list: number[], i: number): number {
    return list[i] ?? Number.NaN;
  }
}
