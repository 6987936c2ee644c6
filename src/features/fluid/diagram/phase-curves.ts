/** The phase diagram of a fluid in the units shown: lines, marked points and what they say. Pure; the chart only draws. */
import type { CurveAxis, CurveMark } from "@/components/charts/curve";
import type { PhaseLine, PhasePoint } from "@/components/charts/phase-line";
import { formatNumber, formatQuantity } from "@/components/quantity/format";
import { precisionOf } from "@/components/quantity/precision";
import { shownAbsolutePressure, shownUnit } from "@/components/quantity/shown-units";
import type { UnitSystem } from "@/components/units/unit-system";
import type { StatePoint } from "@/engine/cases/path-case";
import type { PhaseEnvelope } from "@/engine/flash/phase-envelope";
import type { DiagramLines } from "@/engine/properties/diagram-lines";
import { fromSi } from "@/engine/units";

/** Pressure and temperature of the fluid along a run, in order of time. */
export type RunPath = { pressurePa: readonly number[]; temperatureK: readonly number[]; vapourMoleFraction: readonly number[] };

export type DiagramInput = {
  envelope: PhaseEnvelope | null;
  lines: DiagramLines | null;
  pure: boolean;
  /** Water is present beside other components. */
  wet?: boolean;
  start?: StatePoint | undefined;
  path?: RunPath | undefined;
  /** Another state to be marked. */
  state?: StatePoint | undefined;
  /** No table of the marked points stands beside the chart: their figures go to the marks. */
  figuresAtMarks?: boolean;
};

export type DrawnDiagram = {
  x: CurveAxis;
  y: CurveAxis;
  lines: PhaseLine[];
  marks: CurveMark[];
  /** Marked points with both figures, for the table beside the chart. */
  points: { name: string; at: string }[];
};

export function drawDiagram(
  { envelope, lines, pure, start, path, state, figuresAtMarks }: DiagramInput,
  system: UnitSystem,
): DrawnDiagram {
  const units = { pressure: shownAbsolutePressure[system], temperature: shownUnit("temperature", system) };
  const place = ({ temperatureK, pressurePa }: StatePoint): PhasePoint => ({
    x: fromSi("temperature", temperatureK, units.temperature),
    y: fromSi("pressure", pressurePa, units.pressure),
  });
  const line = (id: string, label: string, tone: PhaseLine["tone"], points: readonly StatePoint[]): PhaseLine[] =>
    points.length > 1 ? [{ id, label, tone, points: points.map(place) }] : [];
  const temperature = (si: number) => formatQuantity("temperature", si, units.temperature).text;
  const pressure = (si: number) => formatQuantity("pressure", si, units.pressure).text;

  const named = (name: string, figure: string | undefined) => (figuresAtMarks && figure ? `${name} ${figure}` : name);

  const marked: { name: string; label: string; at: StatePoint | undefined }[] = [
    { name: "Critical point", label: "critical", at: envelope?.critical },
    ...(pure
      ? []
      : [
          {
            name: "Cricondentherm, highest temperature of two phases",
            label: named("cricondentherm", envelope?.cricondentherm && temperature(envelope.cricondentherm.temperatureK)),
            at: envelope?.cricondentherm,
          },
          {
            name: "Cricondenbar, highest pressure of two phases",
            label: named("cricondenbar", envelope?.cricondenbar && pressure(envelope.cricondenbar.pressurePa)),
            at: envelope?.cricondenbar,
          },
        ]),
    { name: "Triple point of carbon dioxide", label: "triple point", at: lines?.triple },
    { name: "Start of the blowdown", label: "start", at: start },
    { name: "State of the table", label: "state", at: state && !(start && near(state, start)) ? state : undefined },
  ];
  const present = marked.flatMap(({ at, ...rest }) => (at ? [{ ...rest, at }] : []));

  return {
    x: {
      name: "temperature",
      unit: units.temperature,
      format: (value) => formatNumber(value, precisionOf("temperature", units.temperature)),
    },
    y: {
      name: "pressure",
      unit: units.pressure,
      fromZero: true,
      format: (value) => formatNumber(value, precisionOf("pressure", units.pressure)),
    },
    lines: [
      ...(lines?.shares ?? []).flatMap(({ vapourMoleFraction, points }) =>
        line(`share-${vapourMoleFraction}`, `${Math.round(vapourMoleFraction * 100)}\u00a0% vapour`, "share", points),
      ),
      ...line("frost", "solid CO2 below", "frost", lines?.solidCarbonDioxide ?? []),
      ...line("hydrate", "hydrate below", "hydrate", lines?.hydrate?.points ?? []),
      ...envelopeLines(envelope, pure, line),
      ...(path ? line("path", "blowdown", "fluid", pathPoints(path)) : []),
    ],
    marks: present.map(({ label, at }) => ({ ...place(at), label })),
    points: present.map(({ name, at }) => ({ name, at: `${pressure(at.pressurePa)}, ${temperature(at.temperatureK)}` })),
  };
}

type MakeLine = (id: string, label: string, tone: PhaseLine["tone"], points: readonly StatePoint[]) => PhaseLine[];

/** Both lines meet in the critical point; of a pure fluid they are one, the vapour pressure. */
function envelopeLines(envelope: PhaseEnvelope | null, pure: boolean, line: MakeLine): PhaseLine[] {
  if (!envelope) return [];
  const dew = envelope.points.filter((point) => point.line === "dew");
  const bubble = envelope.points.filter((point) => point.line === "bubble");
  const { critical } = envelope;
  if (pure) return line("vapour-pressure", "vapour pressure", "bubble", critical ? [...dew, critical] : dew);
  return [
    ...line("dew", "dew line", "dew", critical ? [...dew, critical] : dew),
    ...line("bubble", "bubble line", "bubble", critical ? [critical, ...bubble] : bubble),
  ];
}

const pathPoints = ({ pressurePa, temperatureK }: RunPath): StatePoint[] =>
  pressurePa.flatMap((p, i) => {
    const T = temperatureK[i];
    return T === undefined ? [] : [{ pressurePa: p, temperatureK: T }];
  });

const near = (a: StatePoint, b: StatePoint): boolean =>
  Math.abs(a.temperatureK - b.temperatureK) < 0.05 && Math.abs(a.pressurePa / b.pressurePa - 1) < 1e-3;

/** The temperature at which a fluid begins to condense on cooling at constant pressure, from the traced dew line. */
export function dewTemperatureAt(envelope: PhaseEnvelope, pressurePa: number): number | undefined {
  const dew = [...envelope.points.filter((point) => point.line === "dew"), ...(envelope.critical ? [envelope.critical] : [])];
  let highest: number | undefined;
  for (let i = 1; i < dew.length; i++) {
    const [a, b] = [dew[i - 1], dew[i]];
    if (!a || !b || (a.pressurePa - pressurePa) * (b.pressurePa - pressurePa) > 0 || a.pressurePa === b.pressurePa) continue;
    const share = Math.log(pressurePa / a.pressurePa) / Math.log(b.pressurePa / a.pressurePa);
    const temperatureK = a.temperatureK + share * (b.temperatureK - a.temperatureK);
    highest = Math.max(highest ?? temperatureK, temperatureK);
  }
  return highest;
}
