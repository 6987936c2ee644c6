/** What the page of a fluid shows of a screening: the composition as reported and as used, where the blowdown starts, where it goes. */
import { molePercentOf } from "@/contracts/derive-si";
import type { DraftDocument } from "@/contracts/draft";
import { moleFractions } from "@/contracts/draft-composition";
import { draftFluid } from "@/contracts/draft-fluid";
import type { RecordContent } from "@/contracts/record-content";
import type { PreparedView, ScreeningView } from "@/contracts/views";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import type { StatePoint } from "@/engine/cases/path-case";
import type { RunPath } from "../diagram/phase-curves";

export type ReportedRow = { id: string; reported: string; moleFraction: number };

export type FluidOfScreening = {
  rows: ReportedRow[];
  /** Of the amounts as reported, mol %. */
  sum: number;
  source: RecordContent["compositionSource"];
  /** Absent while the composition can't be used. */
  fluid?: FluidSpec;
  start?: StatePoint;
  path?: RunPath;
  /** The path belongs to an older composition or older lines. */
  pathIsOlder: boolean;
};

/**
 * The lines as they stand, with the newest run. Where the revision is signed, or its lines are not open to the viewer, what was stored
 * when it was computed.
 */
export function fluidOfScreening({ draft, prepared }: Pick<ScreeningView, "draft" | "prepared">): FluidOfScreening | null {
  const asDrafted = draft && (!prepared || prepared.stale);
  const base = asDrafted ? ofDraft(draft.document) : prepared ? ofRecord(prepared) : null;
  if (!base) return null;
  const run = prepared?.runs[0];
  const path = run && pathOf(run.result.series);
  const start = (prepared && !prepared.stale && path ? startOf(path) : undefined) ?? base.start ?? (path && startOf(path));
  return { ...base, ...(start ? { start } : {}), ...(path ? { path } : {}), pathIsOlder: prepared?.stale ?? false };
}

type Base = Omit<FluidOfScreening, "path" | "pathIsOlder">;

function ofDraft(document: DraftDocument): Base {
  const { rows, source } = document.composition;
  const used = new Map(moleFractions(document).map(({ id, moleFraction }) => [id, moleFraction]));
  const fluid = draftFluid(document);
  const [pressurePa, temperatureK] = [document.lines["2.09"]?.si, document.lines["2.10"]?.si];
  return {
    rows: rows.map(({ id, typed }) => ({ id, reported: typed, moleFraction: used.get(id) ?? 0 })),
    sum: rows.reduce((sum, { molePercent }) => sum + (molePercent ?? 0), 0),
    source,
    ...(fluid ? { fluid } : {}),
    ...(pressurePa != null && temperatureK != null ? { start: { pressurePa, temperatureK } } : {}),
  };
}

function ofRecord({ content, runs }: PreparedView): Base {
  const fluid = runs[0]?.document.fluid;
  return {
    rows: content.composition.map(({ id, typed, moleFraction }) => ({ id, reported: typed, moleFraction })),
    sum: content.composition.reduce((sum, { typed }) => sum + (molePercentOf(typed) ?? 0), 0),
    source: content.compositionSource,
    ...(fluid ? { fluid } : {}),
  };
}

const pathOf = ({
  pressurePa,
  fluidTemperatureK,
  vapourMoleFraction,
}: PreparedView["runs"][number]["result"]["series"]): RunPath => ({
  ...{ pressurePa, vapourMoleFraction },
  temperatureK: fluidTemperatureK,
});

function startOf({ pressurePa: [p], temperatureK: [T] }: RunPath): StatePoint | undefined {
  return p === undefined || T === undefined ? undefined : { pressurePa: p, temperatureK: T };
}
