/** Curves of one piece of steel in a fire: its hot strength, its stress with and without the blowdown, and its temperature. */
import type { CurveMark, Curves } from "@/components/charts/curve";
import { formatNumber, formatQuantity } from "@/components/quantity/format";
import { precisionOf } from "@/components/quantity/precision";
import { shownUnit } from "@/components/quantity/shown-units";
import type { SteelInFire, SteelInFireItem } from "@/engine/cases/blowdown-result";
import { fromSi, standardAtmospherePa } from "@/engine/units";
import type { Showing } from "./limit-rows";

/** initialPressurePa   at which the stress of the first row stands; the held one follows from it by the gauge pressures */
export function steelCurves(item: SteelInFireItem, fire: SteelInFire, initialPressurePa: number, { system }: Showing) {
  const { timeS, wallTemperatureK, stressPa, strengthPa } = item.series;
  const minutes = (seconds: number) => fromSi("time", seconds, "min");
  const x = {
    name: "time since the fire began",
    unit: "min",
    min: 0,
    max: minutes(timeS.at(-1) ?? 0),
    format: (value: number) => formatNumber(value, { decimals: 1 }),
  };
  const stress = (pa: number) => (system === "SI" ? fromSi("pressure", pa, "MPa") : fromSi("pressureDifference", pa, "psi"));
  const heldPa =
    ((stressPa[0] ?? Number.NaN) * (fire.shutInPressurePa - standardAtmospherePa)) / (initialPressurePa - standardAtmospherePa);
  const times = timeS.map(minutes);
  const moment = (seconds: number) => formatQuantity("time", seconds, "min").text;
  const strengthAt = (seconds: number) => {
    const row = timeS.findIndex((time) => time >= seconds);
    return stress(strengthPa[row < 0 ? strengthPa.length - 1 : row] ?? Number.NaN);
  };
  const marks: CurveMark[] = [
    {
      x: minutes(item.leastRatioTimeS),
      y: strengthAt(item.leastRatioTimeS),
      label: `least ratio ${formatNumber(item.leastRatio, { figures: 2 })}`,
    },
  ];
  if (item.ruptureTimeShutInS !== undefined)
    marks.push({
      x: minutes(item.ruptureTimeShutInS),
      y: strengthAt(item.ruptureTimeShutInS),
      label: `rupture at ${moment(item.ruptureTimeShutInS)} without blowdown`,
    });
  const strength: Curves = {
    x,
    y: { name: "stress and strength", unit: system === "SI" ? "MPa" : "psi", log: true },
    series: [
      { id: "strength", label: "strength of hot steel", tone: "wall", x: times, y: strengthPa.map(stress) },
      { id: "stress", label: "stress with blowdown", tone: "pressure", x: times, y: stressPa.map(stress) },
      { id: "held", label: "stress without", tone: "outer-wall", x: times, y: times.map(() => stress(heldPa)) },
    ],
    marks,
  };
  const unit = shownUnit("temperature", system);
  const temperature: Curves = {
    x,
    y: {
      name: `temperature of ${item.name}`,
      unit,
      format: (value) => formatNumber(value, precisionOf("temperature", unit)),
    },
    series: [
      {
        id: "steel",
        label: item.part === "dry" ? "dry wall" : "wetted wall",
        tone: item.part === "dry" ? "wall" : "liquid-wall",
        x: times,
        y: wallTemperatureK.map((kelvin) => fromSi("temperature", kelvin, unit)),
      },
    ],
  };
  return { strength, temperature };
}
