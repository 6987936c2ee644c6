/** What the reader of a run must know: data used outside their range, doubtful regions, a run that was cut short. */
import { findLibraryRow } from "../../substances/library";
import type { BlowdownCase } from "../blowdown-case";
import type { BlowdownSummary, Warning } from "../blowdown-result";
import type { Run } from "./integrate-run";
import type { Row } from "./series";
import { carbonDioxideSublimationPa, solidCurves } from "./solid-check";
import type { VesselModel } from "./vessel-model";
import { waterWarnings } from "./water-warnings";

export const closureLimit = 1e-4;

/** The worst of the four closures of a run. */
export const closureOf = (summary: BlowdownSummary): number =>
  Math.max(summary.massClosure, summary.energyClosure, summary.massClosureRecounted ?? 0, summary.energyClosureRecounted ?? 0);

export function warningsOf(
  blowdown: BlowdownCase,
  model: VesselModel,
  run: Run,
  rows: Row[],
  summary: BlowdownSummary,
): Warning[] {
  return [
    ...model.fluid.notes.map((message) => ({ code: "fluid-data", message })),
    ...dataRange(blowdown, summary),
    ...nearCritical(blowdown, model, rows),
    ...solids(blowdown, run, rows, summary),
    ...waterWarnings(blowdown, model),
    ...wallTable(model, summary),
    ...wallProfile(blowdown, model, summary),
    ...unknownLevel(blowdown, model, run),
    ...outletPhase(blowdown, run, rows),
    ...dryInPoolFire(blowdown, rows),
    ...howItEnded(blowdown, run),
    ...closure(summary),
  ];
}

function dataRange({ fluid }: BlowdownCase, { minimumFluidTemperatureK, minimumOutletTemperatureK }: BlowdownSummary): Warning[] {
  const coldest = Math.min(minimumFluidTemperatureK, minimumOutletTemperatureK);
  return fluid.components.flatMap(({ id, moleFraction, custom }) => {
    const low = custom ? custom.idealGasHeatCapacityOverR.rangeK[0] : findLibraryRow(id)?.cp0.range_K[0];
    if (low === undefined || moleFraction === 0 || coldest >= low) return [];
    return [
      {
        code: "outside-data-range",
        message: `The fluid reaches ${coldest.toFixed(1)} K; the heat capacity of ${id} is known from ${low} K upward.`,
      },
    ];
  });
}

/** Density within 30 % of the critical and temperature within 2 %: the cubic's energies are least sure there (pure fluids). */
function nearCritical({ fluid }: BlowdownCase, model: VesselModel, rows: Row[]): Warning[] {
  if (fluid.components.filter((component) => component.moleFraction > 0).length !== 1) return [];
  const only = fluid.components.findIndex((component) => component.moleFraction > 0);
  const Tc = model.fluid.criticalTemperaturesK[only] ?? 0;
  const pc = model.fluid.criticalPressuresPa[only] ?? 0;
  const close = rows.find((row) => Math.abs(row.temperatureK / Tc - 1) < 0.02 && Math.abs(row.pressurePa / pc - 1) < 0.1);
  return close
    ? [
        {
          code: "near-critical",
          message: `At ${close.timeS.toPrecision(3)} s the fluid is near its critical point, where the equation of state is least sure.`,
        },
      ]
    : [];
}

function solids(blowdown: BlowdownCase, run: Run, rows: Row[], { minimumFluidTemperatureK }: BlowdownSummary): Warning[] {
  const found: Warning[] = [];
  if (run.endedBy === "solid-phase") {
    found.push({
      code: "solid-phase",
      message: `At ${run.endTimeS.toPrecision(4)} s solid begins to form. The run ends there: solid may plug the outlet and hold back pressure, and re-warming releases it.`,
    });
  }
  const dioxide = solidCurves(blowdown.fluid).find((curve) => curve.sublimationPa);
  const throat = rows.find(
    (row) =>
      dioxide?.pure &&
      row.throatTemperatureK < dioxide.triplePointK &&
      carbonDioxideSublimationPa(row.throatTemperatureK) < row.pressurePa,
  );
  if (throat && run.endedBy !== "solid-phase")
    found.push({
      code: "solid-in-throat",
      message: `From ${throat.timeS.toPrecision(3)} s the throat is below the triple point of carbon dioxide: solid can form in the outlet.`,
    });
  const present = blowdown.fluid.components.filter(({ moleFraction, custom, pseudo }) => moleFraction > 0 && !custom && !pseudo);
  for (const { id, moleFraction } of present.length > 1 ? present : []) {
    const triple = findLibraryRow(id)?.triplePoint.T_K;
    if (triple !== undefined && minimumFluidTemperatureK < triple) {
      found.push({
        code: "below-triple-point",
        message: `The fluid reaches ${minimumFluidTemperatureK.toFixed(1)} K, below the triple point of ${id} (${triple.toFixed(1)} K, mole fraction ${moleFraction}). Check whether it freezes out; this is not computed.`,
      });
    }
  }
  return found;
}

function wallTable({ wall }: VesselModel, { minimumWallTemperatureK }: BlowdownSummary): Warning[] {
  if (!wall?.fromTable || minimumWallTemperatureK === undefined) return [];
  const [low, high] = wall.steel.specificHeatRangeK;
  if (minimumWallTemperatureK >= low && minimumWallTemperatureK <= high) return [];
  return [
    {
      code: "outside-data-range",
      message: `The wall reaches ${minimumWallTemperatureK.toFixed(1)} K; the specific heat of ${wall.steel.name.toLowerCase()} is tabulated from ${low} to ${high} K.`,
    },
  ];
}

/** A lump hides the cold inside of a thick wall; the profile is wrong while it is still forming. */
function wallProfile({ heat, vessel }: BlowdownCase, { wall, start }: VesselModel, { endTimeS }: BlowdownSummary): Warning[] {
  if (!wall || !vessel.wall || heat.inside.model !== "constant") return [];
  const biot = (heat.inside.coefficientWPerM2K * vessel.wall.thicknessM) / wall.steel.conductivityWPerMK(start.temperatureK);
  if (heat.wall.model === "lumped" && biot > 0.1) {
    return [
      {
        code: "thick-wall",
        message: `Film times thickness over conductivity is ${biot.toPrecision(2)}, above 0.1: the inside of the wall is colder than the one temperature shown. Use the wall model "conduction".`,
      },
    ];
  }
  if (wall.slowestModeS > 0.1 * endTimeS) {
    return [
      {
        code: "wall-profile-forming",
        message: `The temperature profile of the wall takes ${wall.slowestModeS.toPrecision(2)} s to form, which is not short against the run of ${endTimeS.toPrecision(3)} s. The inside surface is less sure.`,
      },
    ];
  }
  return [];
}

/** Correlations need to know what the liquid wets. */
function unknownLevel({ heat }: BlowdownCase, { vessel }: VesselModel, run: Run): Warning[] {
  if (heat.inside.model !== "correlations" || vessel.below || !run.segments.some((segment) => segment.mode !== "one-phase"))
    return [];
  return [
    {
      code: "no-level",
      message:
        "There is liquid, but a plain volume does not tell what it wets: the whole wall counted as dry. Give the vessel's shape.",
    },
  ];
}

/** Frozen flow means a vapour that stays vapour; anything else was taken in equilibrium. */
function outletPhase({ release }: BlowdownCase, run: Run, rows: Row[]): Warning[] {
  if (release.flowModel !== "frozen" || release.from === "vapour") return [];
  const wet = run.segments.some((segment) => segment.mode !== "one-phase") || rows.some((row) => row.vapourMoleFraction === 0);
  return wet
    ? [
        {
          code: "equilibrium-outlet",
          message:
            "Frozen flow holds for a vapour. While liquid left the vessel its flow was computed in equilibrium; a short opening passes more.",
        },
      ]
    : [];
}

function dryInPoolFire({ heat }: BlowdownCase, rows: Row[]): Warning[] {
  if (heat.outside.model !== "pool-fire") return [];
  const dry = rows.find((row) => row.liquidVolumeM3 === 0);
  return dry
    ? [
        {
          code: "dry-in-fire",
          message: `From ${dry.timeS.toPrecision(3)} s nothing wets the wall, and the wetted-area law gives no heat at all. A dry wall in flames fails early: compute it with a surface fire.`,
        },
      ]
    : [];
}

function howItEnded({ run: asked }: BlowdownCase, run: Run): Warning[] {
  if (run.endedBy === "too-hot") {
    return [
      {
        code: "too-hot",
        message: `The fluid reached 1000 K at ${run.endTimeS.toPrecision(4)} s, where the heat capacities end. The run stops there; steel has lost its strength long before.`,
      },
    ];
  }
  if (run.endedBy !== "back-pressure") return [];
  return [
    {
      code: "back-pressure-reached",
      message: `The pressure met the back pressure before it reached ${asked.stopPressurePa} Pa; nothing flows from there on.`,
    },
  ];
}

function closure(summary: BlowdownSummary): Warning[] {
  if (closureOf(summary) <= closureLimit) return [];
  const worst = (a: number, b = 0): string => Math.max(a, b).toExponential(1);
  return [
    {
      code: "does-not-close",
      message: `Mass closes to ${worst(summary.massClosure, summary.massClosureRecounted)} and energy to ${worst(summary.energyClosure, summary.energyClosureRecounted)}, worse than ${closureLimit}. No verdict is given; tighten the tolerance.`,
    },
  ];
}
