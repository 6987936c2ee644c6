"use client";

import Link from "next/link";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import type { StatePoint } from "@/engine/cases/path-case";
import { GroupHead } from "@/components/shell/page-head";
import { FluidEngine } from "../engine/fluid-engine";
import { FluidDiagram, useEnvelope } from "./fluid-diagram";
import type { RunPath } from "./phase-curves";

type Props = {
  fluid: FluidSpec | undefined;
  start: StatePoint | undefined;
  path: RunPath | undefined;
  /** Address of the page of this fluid. */
  href: string;
};

/** The phase diagram of a composition while it is typed, under its lines. */
export function FluidBeside(props: Props) {
  return (
    <section aria-label="Phase diagram">
      <GroupHead aside={<Link href={props.href}>Properties and equations side by side</Link>}>Phase diagram</GroupHead>
      {props.fluid ? (
        <FluidEngine>
          <Diagram {...props} />
        </FluidEngine>
      ) : (
        <p className="py-3 font-serif text-note text-ink-2">It is drawn once the composition can be used.</p>
      )}
    </section>
  );
}

function Diagram({ fluid, start, path }: Props) {
  const envelope = useEnvelope(fluid);
  return (
    <div className="pt-3">
      <FluidDiagram compact {...{ fluid, start, path, envelope }} />
    </div>
  );
}
