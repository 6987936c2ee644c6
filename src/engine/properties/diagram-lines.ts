import type { StatePoint } from "../cases/path-case";
import { EngineError } from "../errors";
import type { FluidModel } from "../eos/fluid-model";
import { flashPQ } from "../flash/flash-quality";
import type { PhaseEnvelope } from "../flash/phase-envelope";
import { onlyComponent } from "../flash/saturation-pure";
import { carbonDioxideTriple } from "../solids/solid-lines";
import { carbonDioxideFrostLine } from "./carbon-dioxide-frost";
import { hydrateLine } from "./hydrate-line";

const lowestPa = 1e5;
/** Hydrate and frost are drawn at least this high [Pa], where the envelope is lower. */
const leastTopPa = 1.5e7;
const qualitySteps = 16;
/** A step along a line of constant vapour share is smaller than this [K], or it is another branch. */
const largestStepK = 25;
/** Lines of constant vapour share inside the envelope [mol/mol]. */
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

/**
 * Lines of constant vapour share inside an envelope, and where hydrate and solid carbon dioxide start. The envelope itself comes from
 * `phaseEnvelope` and is drawn first, as it is ready long before.
 *
 * known   the points that the trace of the envelope found; without one the lines of vapour share are left out
 */
export function diagramLines(model: FluidModel, known: Pick<PhaseEnvelope, "critical" | "cricondenbar">): DiagramLines {
  const only = onlyComponent(model.feed);
  const topPa = Math.max(leastTopPa, known.cricondenbar?.pressurePa ?? 0);
  const hydrate = hydrateLine(model, lowestPa, topPa);
  return {
    shares: only < 0 ? shares.map((share) => shareLine(model, share, known)) : [],
    ...("points" in hydrate ? { hydrate } : { withoutHydrate: hydrate.refused }),
    solidCarbonDioxide: carbonDioxideFrostLine(model, lowestPa, topPa),
    ...(model.componentIds[only] === "carbon_dioxide" ? { triple: carbonDioxideTriple } : {}),
  };
}

/** From 1 bar to the critical pressure; the line ends where a point is not found or lies on another branch. */
function shareLine(model: FluidModel, vapourMoleFraction: number, known: Pick<PhaseEnvelope, "critical" | "cricondenbar">) {
  const points: StatePoint[] = [];
  const topPa = (known.critical ?? known.cricondenbar)?.pressurePa;
  if (topPa === undefined || topPa <= lowestPa) return { vapourMoleFraction, points };
  for (let k = 0; k < qualitySteps; k++) {
    const pressurePa = lowestPa * (topPa / lowestPa) ** (k / qualitySteps);
    const temperatureK = temperatureAt(model, vapourMoleFraction, pressurePa);
    const last = points.at(-1);
    if (temperatureK === undefined || (last && Math.abs(temperatureK - last.temperatureK) > largestStepK)) break;
    points.push({ temperatureK, pressurePa });
  }
  if (known.critical && points.length === qualitySteps) points.push(known.critical);
  return { vapourMoleFraction, points };
}

function temperatureAt(model: FluidModel, vapourMoleFraction: number, pressurePa: number): number | undefined {
  try {
    return flashPQ(model, { pressurePa, vapourMoleFraction }).temperatureK;
  } catch (error) {
    if (error instanceof EngineError) return undefined;
    throw error;
  }
}
