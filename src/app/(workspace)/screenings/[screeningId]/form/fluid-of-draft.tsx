"use client";

import { useMemo } from "react";
import { draftFluid } from "@/contracts/draft-fluid";
import { pages } from "@/contracts/paths";
import { FluidBeside } from "@/features/fluid/diagram/fluid-beside";
import { useForerunState } from "@/features/screening/forerun/forerun-context";
import { useDraft } from "@/features/screening/form/draft-context";

/** The phase diagram under part 3 of the form, with the path of the Forerun once there is one. */
export function FluidOfDraft() {
  const { draft, made, subject } = useDraft();
  const { result } = useForerunState();
  const fluid = useMemo(() => draftFluid(draft), [draft]);
  // While lines are missing or wrong the last run belongs to other lines.
  const series = made.document ? result?.series : undefined;
  const path = useMemo(
    () =>
      series && {
        pressurePa: series.pressurePa,
        temperatureK: series.fluidTemperatureK,
        vapourMoleFraction: series.vapourMoleFraction,
      },
    [series],
  );
  const [typedP, typedT] = [draft.lines["2.09"]?.si, draft.lines["2.10"]?.si];
  const [p, T] = [path?.pressurePa[0] ?? typedP, path?.temperatureK[0] ?? typedT];
  const start = useMemo(() => (p == null || T == null ? undefined : { pressurePa: p, temperatureK: T }), [p, T]);
  return <FluidBeside fluid={fluid} start={start} path={path} href={pages.fluid(subject.screeningId)} />;
}
