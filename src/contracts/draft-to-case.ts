/**
 * One case document made of a draft, with what stands in the way.
 *
 * Three kinds of trouble, all cited by line: `missing` (asked for and empty), `problems` (typed, but not usable) and `withoutSource` (usable,
 * but nobody said where it comes from; it blocks signing, not computing).
 */
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import { shapeGeometry } from "./draft-geometry";
import { askedKeys, type DraftDocument, type LineValue } from "./draft";
import type { LineKey, LineNo, QuantityLine } from "./lines/line";
import { lineByNo, lineKey } from "./lines/registry";
import type { LimitPolicy } from "./policy";

export type LineProblem = { line: LineKey; message: string };

export type CaseFromDraft = {
  /** Present only when nothing is missing and nothing is wrong. */
  document?: BlowdownCase;
  missing: LineKey[];
  problems: LineProblem[];
  withoutSource: LineKey[];
};

export type SiteFacts = { barometricPressurePa: number; policy: LimitPolicy };

/** Sum of the composition may differ from 100 % by this much before normalising is refused as a mistake. */
export const compositionSlackPercent = 5;

/**
 * Makes the case of one letter.
 *
 * draft, letter  the draft and the case's letter ("A")
 * site           barometric pressure and limit policy of the facility
 * Returns        the case with SI values, or every line that stands in the way
 */
export function caseFromDraft(draft: DraftDocument, letter: string, site: SiteFacts): CaseFromDraft {
  const asked = askedKeys(draft).filter((entry) => entry.letter === letter || lineKey(entry.line, "A") === lineKey(entry.line, "B"));
  const missing: LineKey[] = [];
  const problems: LineProblem[] = [];
  const withoutSource: LineKey[] = [];

  for (const { key, line } of asked) {
    if (line.kind === "derived") continue;
    if (line.kind === "composition") {
      checkComposition(draft, key, { missing, problems, withoutSource });
      continue;
    }
    const value = draft.lines[key];
    if (isEmpty(value, line.kind === "quantity")) {
      if (!line.optional) missing.push(key);
      continue;
    }
    if (!value) continue;
    if (line.kind === "quantity") {
      const problem = quantityProblem(line, value);
      if (problem) problems.push({ line: key, message: problem });
    }
    if (line.kind === "choice" && !line.options.some((option) => option.value === value.typed)) {
      problems.push({ line: key, message: `“${value.typed}” is not one of the choices of this line. Choose again.` });
    }
    if (!line.sourceFree && line.kind === "quantity" && !value.source?.note.trim()) withoutSource.push(key);
  }

  const clear = missing.length === 0 && problems.length === 0;
  const crossed = clear ? crossProblems(draft, letter, site) : [];
  problems.push(...crossed);
  return {
    ...(clear && crossed.length === 0 ? { document: assemble(draft, letter, site) } : {}),
    missing,
    problems,
    withoutSource,
  };
}

const isEmpty = (value: LineValue | undefined, quantity: boolean) =>
  !value || (value.typed.trim() === "" && (!quantity || value.si === null));

function quantityProblem(line: QuantityLine, value: LineValue): string | undefined {
  if (value.si === null) return `“${value.typed}” is not a number with a unit of this line. Type a figure, for example 12.5.`;
  if (!Number.isFinite(value.si)) return "The figure is not finite. Type another.";
  const low = line.exclusiveMin ? value.si <= line.min : value.si < line.min;
  if (low || value.si > line.max) return outOfRange(line);
  return undefined;
}

/** Ranges are kept in SI; the form writes them in the unit in use beside this sentence. */
const outOfRange = (line: QuantityLine) => `The value lies outside the range that holds for “${line.label.toLowerCase()}”. Check figure and unit.`;

function checkComposition(draft: DraftDocument, key: LineKey, out: Pick<CaseFromDraft, "missing" | "problems" | "withoutSource">): void {
  const { rows, normalised, source } = draft.composition;
  const bad = rows.find((row) => row.molePercent === null);
  if (bad) {
    out.problems.push({ line: key, message: `The amount of ${bad.id.replaceAll("_", " ")}, “${bad.typed}”, is not a number. Type mol %, for example 4.5.` });
    return;
  }
  const sum = compositionSum(draft);
  if (rows.length === 0 || sum === 0) {
    out.missing.push(key);
    return;
  }
  const doubled = rows.find((row, at) => rows.findIndex((other) => other.id === row.id) !== at);
  if (doubled) out.problems.push({ line: key, message: `${doubled.id.replaceAll("_", " ")} stands twice. Add the two amounts and remove one row.` });
  if (Math.abs(sum - 100) > compositionSlackPercent) {
    out.problems.push({ line: key, message: `The amounts sum to ${sum.toFixed(3)} mol %, too far from 100 to scale. Check for a missing row or a wrong decimal.` });
  } else if (Math.abs(sum - 100) > 1e-4 && !normalised) {
    out.problems.push({ line: key, message: `The amounts sum to ${sum.toFixed(3)} mol %. Correct them, or choose “Normalise and keep both columns”.` });
  }
  if (!source?.note.trim()) out.withoutSource.push(key);
}

export const compositionSum = (draft: DraftDocument): number => draft.composition.rows.reduce((sum, row) => sum + (row.molePercent ?? 0), 0);

/** Mole fractions as they enter the case: zero rows left out, the rest divided by their sum. */
export function moleFractions(draft: DraftDocument): { id: string; moleFraction: number }[] {
  const sum = compositionSum(draft);
  return draft.composition.rows.flatMap(({ id, molePercent }) => (molePercent ? [{ id, moleFraction: molePercent / sum }] : []));
}

function crossProblems(draft: DraftDocument, letter: string, site: SiteFacts): LineProblem[] {
  const found: LineProblem[] = [];
  const si = siReader(draft, letter);
  const start = si("2.09") as number;
  const back = si("5.04") as number;
  const stop = si("7.11") as number;
  const target = si("7.09") ?? site.policy.targetPressurePaGauge + site.barometricPressurePa;
  if (back >= start) found.push({ line: lineKey(lineByNo("5.04"), letter), message: "The back pressure must be below the pressure at start, line 2.09." });
  if (stop >= start) found.push({ line: lineKey(lineByNo("7.11"), letter), message: "The run must end below the pressure at start, line 2.09." });
  if (target >= start) {
    found.push({
      line: lineKey(lineByNo("7.09"), letter),
      message: "The target pressure is not below the pressure at start, line 2.09. Set a lower target here.",
    });
  }
  const geometry = shapeGeometry(draft);
  const bore = si("5.02") as number;
  if (geometry && bore > geometry.largestBoreM) {
    found.push({ line: lineKey(lineByNo("5.02"), letter), message: "The bore is larger than the vessel. Check figure and unit." });
  }
  return found;
}

function siReader(draft: DraftDocument, letter: string): (no: LineNo) => number | undefined {
  return (no) => draft.lines[lineKey(lineByNo(no), letter)]?.si ?? undefined;
}

function assemble(draft: DraftDocument, letter: string, site: SiteFacts): BlowdownCase {
  const si = siReader(draft, letter);
  const choice = (no: LineNo) => draft.lines[lineKey(lineByNo(no), letter)]?.typed ?? "";
  const required = (no: LineNo) => si(no) as number;
  const geometry = shapeGeometry(draft);
  if (!geometry) throw new RangeError("the inventory is not complete");

  const walled = choice("4.08") === "lumped";
  const optional = <K extends string>(key: K, value: number | undefined) => (value === undefined ? {} : ({ [key]: value } as Record<K, number>));
  const policy = site.policy;
  return {
    format: "ebbmark-case/1",
    kind: "blowdown",
    title: choice("1.10"),
    fluid: {
      components: moleFractions(draft),
      equation: choice("3.02") as BlowdownCase["fluid"]["equation"],
      interaction: choice("3.03") as "library" | "none",
    },
    vessel: {
      geometry: geometry.document,
      ...(walled
        ? {
            wall: {
              steel: choice("4.02"),
              thicknessM: required("4.03"),
              ...optional("massKg", si("4.10")),
              ...optional("designPressurePa", si("4.11")),
              ...optional("minimumDesignMetalTemperatureK", si("4.05")),
            },
          }
        : {}),
    },
    start: { pressurePa: required("2.09"), temperatureK: required("2.10") },
    release: {
      path: "orifice",
      diameterM: required("5.02"),
      dischargeCoefficient: required("5.03"),
      from: "vapour",
      backPressurePa: required("5.04"),
      openingTimeS: required("5.05"),
      flowModel: choice("5.09") as BlowdownCase["release"]["flowModel"],
    },
    heat: {
      inside: walled && choice("6.01") === "constant" ? { model: "constant", coefficientWPerM2K: required("6.08") } : { model: "none" },
      wall: walled ? { model: "lumped" } : { model: "none" },
      outside: choice("6.02") === "constant-heat" ? { model: "constant-heat", heatW: required("6.09") } : { model: "adiabatic" },
    },
    run: { stopTimeS: required("7.10"), stopPressurePa: required("7.11"), relativeTolerance: 1e-6 },
    limits: {
      targetTimeS: si("7.01") ?? policy.targetTimeS,
      targetPressurePa: si("7.09") ?? policy.targetPressurePaGauge + site.barometricPressurePa,
      ...(walled ? { minimumMetalMarginK: si("7.02") ?? policy.minimumMetalMarginK } : {}),
      ...optional("ventCapacityKgPerS", si("7.04") ?? policy.ventCapacityKgPerS),
      ...optional("minimumOutletTemperatureK", si("7.03") ?? policy.minimumOutletTemperatureK),
      nearBandK: policy.nearBandK,
      nearBandFraction: policy.nearBandFraction,
    },
  };
}
