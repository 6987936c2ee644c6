/** The case document of a draft whose lines are all there and hold together. SI inside; keys as docs/case-format.md gives them. */
import type { BlowdownCase, LimitSpec, Outside, ReleaseSpec, StartSpec, WallSpec } from "@/engine/cases/blowdown-case";
import type { FireBasis } from "@/engine/heat/surface-fire";
import { isAsked, type DraftDocument } from "./draft";
import { moleFractions } from "./draft-composition";
import { liquidAtStart, shapeGeometry } from "./draft-geometry";
import type { SiteFacts } from "./draft-to-case";
import type { LineNo } from "./lines/line";
import { lineByNo, lineKey } from "./lines/registry";
import { policyLimit } from "./policy-limit";

/** Reads one case of a draft; a line that is not asked for reads as if nothing stood there. */
type Values = {
  asked: (no: LineNo) => boolean;
  choice: (no: LineNo) => string;
  si: (no: LineNo) => number | undefined;
  required: (no: LineNo) => number;
};

export function valuesOf(draft: DraftDocument, letter: string): Values {
  const asked = (no: LineNo) => isAsked(lineByNo(no), draft, letter);
  const value = (no: LineNo) => (asked(no) ? draft.lines[lineKey(lineByNo(no), letter)] : undefined);
  const si = (no: LineNo) => value(no)?.si ?? undefined;
  return {
    asked,
    si,
    choice: (no) => value(no)?.typed ?? "",
    required: (no) => {
      const found = si(no);
      if (found === undefined) throw new RangeError(`line ${no} is not settled`);
      return found;
    },
  };
}

const optional = <K extends string>(key: K, value: number | undefined) =>
  value === undefined ? {} : ({ [key]: value } as Record<K, number>);

export function assembleCase(draft: DraftDocument, letter: string, site: SiteFacts): BlowdownCase {
  const values = valuesOf(draft, letter);
  const { choice, required } = values;
  const geometry = shapeGeometry(draft);
  if (!geometry) throw new RangeError("the inventory is not complete");
  const wallModel = choice("4.08") as BlowdownCase["heat"]["wall"]["model"];
  const walled = wallModel !== "none";
  const film = choice("6.01");
  return {
    format: "ebbmark-case/1",
    kind: "blowdown",
    title: choice("1.10"),
    fluid: {
      components: moleFractions(draft),
      equation: choice("3.02") as BlowdownCase["fluid"]["equation"],
      interaction: choice("3.03") as "library" | "none",
    },
    vessel: { geometry: geometry.document, ...(walled ? { wall: wallOf(values) } : {}) },
    start: startOf(values, liquidAtStart(draft, geometry)?.part),
    release: releaseOf(values, site),
    heat: {
      inside:
        film === "constant"
          ? { model: "constant", coefficientWPerM2K: required("6.08") }
          : { model: film === "correlations" ? "correlations" : "none" },
      wall: { model: wallModel },
      outside: outsideOf(values),
    },
    run: { stopTimeS: required("7.10"), stopPressurePa: required("7.11"), relativeTolerance: 1e-6 },
    limits: limitsOf(values, site),
    ...afterwardsOf(values),
  };
}

function afterwardsOf({ si }: Values): Pick<BlowdownCase, "afterwards"> {
  const given = { ...optional("ambientTemperatureK", si("6.14")), ...optional("coefficientWPerM2K", si("6.15")) };
  return Object.keys(given).length > 0 ? { afterwards: given } : {};
}

function wallOf({ choice, si, required }: Values): WallSpec {
  return {
    steel: choice("4.02"),
    thicknessM: required("4.03"),
    ...optional("massKg", si("4.10")),
    ...optional("specificHeatJPerKgK", si("4.15")),
    ...optional("designPressurePa", si("4.11")),
    ...optional("minimumDesignMetalTemperatureK", si("4.05")),
    ...(choice("4.12") === "fitted"
      ? { insulation: { thicknessM: required("4.13"), conductivityWPerMK: required("4.14") } }
      : {}),
  };
}

function startOf({ choice, si, required }: Values, liquidPart: number | undefined): StartSpec {
  const condition = choice("2.08");
  const rest = optional("restAtTemperatureK", si("2.11"));
  if (condition === "pressure-temperature") return { pressurePa: required("2.09"), temperatureK: required("2.10"), ...rest };
  if (liquidPart === undefined) throw new RangeError("the liquid at start is not settled");
  return condition === "temperature-level"
    ? { temperatureK: required("2.10"), liquidVolumeFraction: liquidPart, ...rest }
    : { pressurePa: required("2.09"), liquidVolumeFraction: liquidPart, ...rest };
}

function releaseOf({ choice, si, required }: Values, site: SiteFacts): ReleaseSpec {
  const from = choice("5.06") as ReleaseSpec["from"];
  const outlet = { from, backPressurePa: required("5.04"), openingTimeS: required("5.05"), ...tailPipeOf({ choice, required }) };
  if (choice("5.01") === "valve")
    return { path: "valve", cv: required("5.07"), xt: required("5.08"), ...outlet, flowModel: "frozen" };
  const orifice = { ...outlet, dischargeCoefficient: required("5.03"), flowModel: choice("5.09") as ReleaseSpec["flowModel"] };
  if (choice("5.01") === "orifice") return { path: "orifice", diameterM: required("5.02"), ...orifice };
  if (choice("5.01") === "relief") {
    return {
      path: "relief",
      areaM2: required("5.12"),
      setPressurePa: required("5.13"),
      reseatPressurePa: required("5.14"),
      ...orifice,
    };
  }
  return {
    path: "sized",
    targetPressurePa: si("5.10") ?? targetPressure(si, site),
    targetTimeS: si("5.11") ?? si("7.01") ?? site.policy.targetTimeS,
    ...orifice,
  };
}

function tailPipeOf({ choice, required }: Pick<Values, "choice" | "required">): Pick<ReleaseSpec, "tailPipe"> {
  if (choice("5.15") !== "fitted") return {};
  return {
    tailPipe: {
      lengthM: required("5.16"),
      diameterM: required("5.17"),
      roughnessM: required("5.18"),
      lossCoefficient: required("5.19"),
    },
  };
}

/** The target pressure that counts, absolute: the one of line 7.09, or the policy's. */
export const targetPressure = (si: Values["si"], site: SiteFacts): number =>
  si("7.09") ?? site.policy.targetPressurePaGauge + site.barometricPressurePa;

function outsideOf({ choice, si, required }: Values): Outside {
  switch (choice("6.02")) {
    case "ambient":
      return { model: "ambient", temperatureK: required("6.10"), coefficientWPerM2K: required("6.11") };
    case "constant-heat":
      return { model: "constant-heat", heatW: required("6.09") };
    case "pool-fire":
      return {
        model: "pool-fire",
        drainage: choice("6.12") === "adequate" ? "adequate" : "inadequate",
        environmentFactor: required("6.13"),
      };
    case "surface-fire":
      return { model: "surface-fire", basis: choice("6.03") as FireBasis, ...optional("heatFluxWPerM2", si("6.04")) };
    default:
      return { model: "adiabatic" };
  }
}

function limitsOf({ asked, choice, si }: Values, site: SiteFacts): LimitSpec {
  const limit = (no: LineNo) => (asked(no) ? (si(no) ?? policyLimit(no, site) ?? undefined) : undefined);
  return {
    ...optional("targetTimeS", limit("7.01")),
    ...optional("targetPressurePa", limit("7.09")),
    ...optional("minimumMetalMarginK", limit("7.02")),
    ...optional("ventCapacityKgPerS", limit("7.04")),
    ...optional("minimumOutletTemperatureK", limit("7.03")),
    ...(choice("7.13") === "present" ? { waterPresent: true } : {}),
    ...optional("nearBandK", limit("7.08")),
    ...optional("nearBandFraction", limit("7.12")),
  };
}
