"use client";

import { useMemo, type ReactNode } from "react";
import type { Ground } from "@/components/charts/curve";
import { PhaseChart } from "@/components/charts/phase-chart";
import { Notice } from "@/components/caution/notice";
import { useShown } from "@/components/quantity/quantity";
import { shownAbsolutePressure } from "@/components/quantity/shown-units";
import { FactTable } from "@/components/table/table";
import { useUnits } from "@/components/units/units-provider";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import type { StatePoint } from "@/engine/cases/path-case";
import type { PhaseEnvelope } from "@/engine/flash/phase-envelope";
import { useFluidAnswer, type FluidAnswered } from "../engine/fluid-engine";
import { diagramNotes, diagramSummary } from "./diagram-words";
import { drawDiagram, type RunPath } from "./phase-curves";

export type DiagramProps = {
  fluid: FluidSpec | undefined;
  start?: StatePoint | undefined;
  path?: RunPath | undefined;
  state?: StatePoint | undefined;
  caption?: ReactNode;
  ground?: Ground;
  /** Smaller, without the table of points, beside a form. */
  compact?: boolean;
};

/** The envelope of a fluid, asked of the engine in the background; where a page needs it beside the diagram, it asks here. */
export const useEnvelope = (fluid: FluidSpec | undefined): FluidAnswered<"envelope"> =>
  useFluidAnswer<"envelope">(fluid && { kind: "envelope", fluid });

/** The phase diagram of a fluid with its start, the path of a run and the state in hand. The envelope stands first; other lines follow. */
export function FluidDiagram({ envelope, ...props }: DiagramProps & { envelope: FluidAnswered<"envelope"> }) {
  const { fluid, start, path, state, caption, ground, compact = false } = props;
  const { system } = useUnits();
  const shown = useShown();
  const known = envelope.current ? envelope.value : null;
  // Without an envelope the other lines are asked for all the same: they do not rest on it.
  const before = known ? knownOf(known) : envelope.problem ? { traced: false } : undefined;
  const lines = useFluidAnswer<"lines">(fluid && before && { kind: "lines", fluid, known: before });
  const pure = isPure(fluid);
  const wet = !pure && (fluid?.components.some(({ id, moleFraction }) => id === "water" && moleFraction > 0) ?? false);

  const write = useMemo(
    () => ({
      temperature: (si: number) => shown("temperature", si).text,
      pressure: (si: number) => shown("pressure", si, { unit: shownAbsolutePressure }).text,
    }),
    [shown],
  );
  const input = useMemo(
    () => ({
      envelope: envelope.problem ? null : envelope.value,
      lines: lines.current ? lines.value : null,
      ...{ pure, wet, start, path, state, figuresAtMarks: compact },
    }),
    [envelope, lines, pure, wet, start, path, state, compact],
  );
  const drawn = useMemo(() => drawDiagram(input, system), [input, system]);
  const notes = useMemo(() => diagramNotes(input, write), [input, write]);

  if (!fluid) return null;
  return (
    <div>
      {envelope.problem && (
        <Notice tone="caution" title="No envelope.">
          {envelope.problem}
        </Notice>
      )}
      <PhaseChart
        {...drawn}
        caption={caption}
        ground={ground}
        height={compact ? "tall" : "diagram"}
        loading={!envelope.value && !envelope.problem}
        stale={!envelope.current && !envelope.problem}
        summary={diagramSummary(input, write)}
      />
      <p role="status" className="sr-only">
        {envelope.current ? "Phase diagram drawn." : envelope.problem ? "" : "The phase envelope is being traced."}
      </p>
      {!compact && drawn.points.length > 0 && (
        <div className="mt-2 max-w-[760px]">
          <FactTable
            caption="Marked points of the diagram"
            facts={drawn.points.map(({ name, at }) => ({ label: name, value: at }))}
          />
        </div>
      )}
      {notes.map((note) => (
        <p key={note} className="pt-1.5 font-serif text-note text-ink-2">
          {note}
        </p>
      ))}
    </div>
  );
}

export const isPure = (fluid: FluidSpec | undefined): boolean =>
  fluid?.components.filter(({ moleFraction }) => moleFraction > 0).length === 1;

const knownOf = ({ cricondenbar }: PhaseEnvelope) => ({
  traced: true,
  ...(cricondenbar ? { cricondenbarPa: cricondenbar.pressurePa } : {}),
});
