import { shownUnit } from "@/components/quantity/shown-units";
import type { RecordContent } from "@/contracts/record-content";
import type { CaseRunView } from "@/contracts/views";
import type { BlowdownSeries } from "@/engine/cases/blowdown-result";
import { fromSi, type QuantityId } from "@/engine/units";
import type { Showing } from "./limit-rows";

type Column = { key: keyof BlowdownSeries; name: string; si: string; quantity: QuantityId | null };

const columns: Column[] = [
  { key: "timeS", name: "time", si: "s", quantity: "time" },
  { key: "pressurePa", name: "pressure", si: "Pa absolute", quantity: "pressure" },
  { key: "fluidTemperatureK", name: "fluid temperature", si: "K", quantity: "temperature" },
  { key: "vapourTemperatureK", name: "vapour temperature", si: "K", quantity: "temperature" },
  { key: "liquidTemperatureK", name: "liquid temperature", si: "K", quantity: "temperature" },
  { key: "gasWallTemperatureK", name: "wall temperature", si: "K", quantity: "temperature" },
  { key: "liquidWallTemperatureK", name: "wall temperature at liquid", si: "K", quantity: "temperature" },
  { key: "massKg", name: "mass inside", si: "kg", quantity: "mass" },
  { key: "ventRateKgPerS", name: "vent rate", si: "kg/s", quantity: "massRate" },
  { key: "ventedMassKg", name: "mass vented", si: "kg", quantity: "mass" },
  { key: "ventedEnergyJ", name: "energy vented", si: "J", quantity: "energy" },
  { key: "vapourMoleFraction", name: "vapour mole fraction", si: "-", quantity: null },
  { key: "liquidLevelM", name: "liquid level", si: "m", quantity: "length" },
  { key: "outletTemperatureK", name: "temperature behind the opening", si: "K", quantity: "temperature" },
];

/**
 * The series of a run for a spreadsheet (RFC 4180, comma and CRLF): each column in SI and beside it in the unit shown. Lines that open with #
 * say what the figures are and which cautions stand with them.
 */
export function dataCsv(
  content: RecordContent,
  { letter, result }: CaseRunView,
  { system, barometricPressurePa }: Showing,
): string {
  const present = columns.flatMap((column) => {
    const values = result.series[column.key];
    return values ? [{ ...column, values, unit: column.quantity && shownUnit(column.quantity, system) }] : [];
  });
  const head = present.flatMap(({ name, si, unit }) => [
    `${name} [${si}]`,
    ...(unit && unit !== si ? [`${name} [${unit}]`] : []),
  ]);
  const rows = result.series.timeS.map((_, row) =>
    present.flatMap(({ values, si, unit, quantity }) => {
      const value = values[row] as number;
      return [
        value,
        ...(unit && unit !== si && quantity ? [Number(fromSi(quantity, value, unit, barometricPressurePa).toPrecision(10))] : []),
      ];
    }),
  );
  const about = [
    `# ${content.record} rev ${content.rev}, case ${letter}, ${content.section.tag} ${content.section.name}${content.facility.demo ? ", demo: invented data" : ""}`,
    `# engine ${content.engineVersion}, case ${result.caseSha256}`,
    ...content.cautions.map(({ id, words }) => `# ${id} ${words}`),
  ];
  return [...about, ...[head, ...rows].map((row) => row.map(cell).join(","))].map((line) => `${line}\r\n`).join("");
}

/** Quoted where the format asks for it. Names of columns are our own; what people typed stands behind a # only. */
function cell(value: string | number): string {
  const text = typeof value === "number" ? (Number.isFinite(value) ? String(value) : "") : value;
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

export const dataFileName = (content: RecordContent, letter: string): string =>
  `${content.record}-rev${content.rev}-${letter}.csv`;
