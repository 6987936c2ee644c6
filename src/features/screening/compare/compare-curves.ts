/** Curves of two runs over each other: the older dotted and grey, the newer in its colours. */
import type { CurveMark, Curves, CurveSeries } from "@/components/charts/curve";
import { formatQuantity } from "@/components/quantity/format";
import { fromSi } from "@/engine/units";
import { runCurves, type RunCurves } from "../results/curves";
import { momentUnit } from "../results/governing";
import type { Showing } from "../results/limit-rows";
import type { Side } from "./sides";

type Name = "pressure" | "temperature" | "ventRate" | "mass";

export function compareCurves(from: Side, to: Side, showing: Showing): Record<Name, Curves> {
  // One unit of time for both, so that they can lie over each other.
  const longest = Math.max(from.run.result.summary.endTimeS, to.run.result.summary.endTimeS);
  const unit = momentUnit(longest);
  const older = inUnit(from, unit, showing);
  const newer = inUnit(to, unit, showing);
  const over = (name: Name): Curves => ({
    ...newer[name],
    x: { ...newer[name].x, max: fromSi("time", longest, unit) },
    series: [...older[name].series.map(ghost), ...newer[name].series],
    marks: [],
  });
  const reached = [from, to].flatMap(({ name, run }): CurveMark[] => {
    const at = run.result.summary.timeToTargetPressureS;
    const target = run.document.limits?.targetPressurePa;
    if (at === undefined || target === undefined) return [];
    const mark = newer.pressure.marks?.[0] ?? older.pressure.marks?.[0];
    return mark ? [{ ...mark, x: fromSi("time", at, unit), label: `${name} ${formatQuantity("time", at, unit).text}` }] : [];
  });
  return {
    pressure: { ...over("pressure"), marks: reached },
    temperature: over("temperature"),
    ventRate: over("ventRate"),
    mass: over("mass"),
  };
}

/** The curves of a run with time in the given unit. */
function inUnit({ run }: Side, unit: "min" | "s", showing: Showing): RunCurves {
  const curves = runCurves(run, showing);
  const own = momentUnit(run.result.summary.endTimeS);
  if (own === unit) return curves;
  const turned = (value: number) => fromSi("time", own === "s" ? value : value * 60, unit);
  const turn = (one: Curves): Curves => ({
    ...one,
    x: { ...one.x, unit },
    series: one.series.map((series) => ({ ...series, x: series.x.map(turned) })),
    limits: (one.limits ?? []).map((limit) => (limit.axis === "x" ? { ...limit, at: turned(limit.at) } : limit)),
    marks: (one.marks ?? []).map((mark) => ({ ...mark, x: turned(mark.x) })),
  });
  return {
    ...curves,
    pressure: turn(curves.pressure),
    temperature: turn(curves.temperature),
    ventRate: turn(curves.ventRate),
    mass: turn(curves.mass),
  };
}

const ghost = (series: CurveSeries): CurveSeries => ({ ...series, id: `older-${series.id}`, label: "", tone: "ghost" });
