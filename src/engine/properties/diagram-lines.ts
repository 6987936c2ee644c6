import type { StatePoint } from "../cases/path-case";
import { EngineError } from "../errors";
import type { FluidModel } from "../eos/fluid-model";
import { phaseEnvelope } from "../flash/phase-envelope";
import { onlyComponent } from "../flash/saturation-pure";
import { carbonDioxideTriple } from "../solids/solid-lines";
import { carbonDioxideFrostLine } from "./carbon-dioxide-frost";
import { hydrateLine } from "./hydrate-line";

const lowestPa = 1e5;
/** Hydrate and frost are drawn at least this high [Pa], where the envelope is lower. */
const leastTopPa = 1.5e7;
/** Lines of constant vapour share inside the envelope [mol/mol]; each trace gives the opposite share as well. */
const shares = [0.9, 0.5] as const;

/** What is drawn into the pressure-temperature diagram of a fluid beside its bubble and dew line. */
export interface DiagramLines {
  /** Lines of constant vapour share. */
  shares: { vapourMoleFraction: number; points: StatePoint[] }[];
  /** Hydrate is to be reckoned with below this line; where there is none, `withoutHydrate` says why. */
  hydrate?: { points: StatePoint[]; marginK: number };
  withoutHydrate?: string;
  /** Solid carbon dioxide forms below this line; empty where there is none. */
  solidCarbonDioxide: StatePoint[];
  /** Of pure carbon dioxide. */
  triple?: StatePoint;
}

/** What is known of the envelope before the other lines are asked for. */
export type KnownEnvelope = { traced: boolean; cricondenbarPa?: number };

/**
 * Lines of constant vapour share inside an envelope, and where hydrate and solid carbon dioxide start. The envelope itself comes from
 * `phaseEnvelope` and is drawn first, as it is ready long before.
 *
 * known   what the trace of the envelope found; where it failed the lines of vapour share are left out
 */
export function diagramLines(model: FluidModel, known: KnownEnvelope): DiagramLines {
  const only = onlyComponent(model.feed);
  const topPa = Math.max(leastTopPa, known.cricondenbarPa ?? 0);
  const hydrate = hydrateLine(model, lowestPa, topPa);
  return {
    shares: only < 0 && known.traced ? shares.flatMap((share) => shareLines(model, share)) : [],
    ...("points" in hydrate ? { hydrate } : { withoutHydrate: hydrate.refused }),
    solidCarbonDioxide: carbonDioxideFrostLine(model, lowestPa, topPa),
    ...(model.componentIds[only] === "carbon_dioxide" ? { triple: carbonDioxideTriple } : {}),
  };
}

/** Two lines of one trace: the share itself up to the critical point, and beyond it the opposite one. Empty where it can't be traced. */
function shareLines(model: FluidModel, share: number): DiagramLines["shares"] {
  try {
    const { points, critical } = phaseEnvelope(model, model.feed, share);
    const of = (line: "dew" | "bubble") => points.filter((point) => point.line === line);
    const end = critical ? [critical] : [];
    return [
      { vapourMoleFraction: share, points: [...of("dew"), ...end] },
      ...(share === 0.5 || of("bubble").length === 0
        ? []
        : [{ vapourMoleFraction: 1 - share, points: [...end, ...of("bubble")] }]),
    ];
  } catch (error) {
    if (error instanceof EngineError) return [];
    throw error;
  }
}
