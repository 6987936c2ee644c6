/**
 * What pages ask of the engine about a fluid, and what comes back. Nothing here is stored; each answer is a pure function of its ask.
 *
 * Throws EngineError where the fluid or a state can't be computed; the worker makes a refusal of it.
 */
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import type { PathCase, PathResult, StatePoint } from "@/engine/cases/path-case";
import { createFluidModel } from "@/engine/eos/create-fluid-model";
import { fitness, type Fitness } from "@/engine/eos/fitness";
import { phaseEnvelope, type PhaseEnvelope } from "@/engine/flash/phase-envelope";
import { runPath } from "@/engine/path/run-path";
import { compareChanges, type ComparedChange } from "@/engine/properties/compare-changes";
import { diagramLines, type DiagramLines, type KnownEnvelope } from "@/engine/properties/diagram-lines";
import { stateProperties, type StateProperties } from "@/engine/properties/state-properties";

export type FluidAsk =
  | { kind: "envelope"; fluid: FluidSpec }
  | { kind: "lines"; fluid: FluidSpec; known: KnownEnvelope }
  | { kind: "state"; fluid: FluidSpec; point: StatePoint }
  | { kind: "equations"; fluid: FluidSpec; point: StatePoint }
  | { kind: "change"; document: PathCase }
  | { kind: "changes"; document: PathCase };

export type FluidAskKind = FluidAsk["kind"];

export type ChangeAnswer = { result: PathResult; from: StateProperties; to: StateProperties };

export type FluidAnswers = {
  envelope: PhaseEnvelope;
  lines: DiagramLines;
  state: StateProperties;
  equations: Fitness[];
  change: ChangeAnswer;
  changes: ComparedChange[];
};

export type FluidAnswer = { [K in FluidAskKind]: { kind: K; value: FluidAnswers[K] } }[FluidAskKind];

export function answerFluid(ask: FluidAsk): FluidAnswer {
  switch (ask.kind) {
    case "envelope":
      return { kind: ask.kind, value: phaseEnvelope(createFluidModel(ask.fluid)) };
    case "lines":
      return { kind: ask.kind, value: diagramLines(createFluidModel(ask.fluid), ask.known) };
    case "state":
      return { kind: ask.kind, value: stateProperties(createFluidModel(ask.fluid), ask.point) };
    case "equations":
      return { kind: ask.kind, value: fitness(ask.fluid, ask.point) };
    case "change": {
      const { document } = ask;
      const model = createFluidModel(document.fluid);
      const result = runPath(document);
      return {
        kind: ask.kind,
        value: { result, from: stateProperties(model, document.from), to: stateProperties(model, document.to) },
      };
    }
    case "changes":
      return { kind: ask.kind, value: compareChanges(ask.document) };
  }
}
