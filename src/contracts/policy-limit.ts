/** What a facility's policy gives for a line of part 7, and which side of it is the stricter one. */
import type { SiteFacts } from "./draft-to-case";
import type { LineNo } from "./lines/line";

type PolicyLine = { of: (site: SiteFacts) => number | undefined; stricter: "lower" | "higher" };

const policyLines: Partial<Record<LineNo, PolicyLine>> = {
  "7.01": { of: ({ policy }) => policy.targetTimeS, stricter: "lower" },
  "7.02": { of: ({ policy }) => policy.minimumMetalMarginK, stricter: "higher" },
  "7.03": { of: ({ policy }) => policy.minimumOutletTemperatureK, stricter: "higher" },
  "7.04": { of: ({ policy }) => policy.ventCapacityKgPerS, stricter: "lower" },
  "7.08": { of: ({ policy }) => policy.nearBandK, stricter: "higher" },
  "7.09": { of: ({ policy, barometricPressurePa }) => policy.targetPressurePaGauge + barometricPressurePa, stricter: "lower" },
  "7.12": { of: ({ policy }) => policy.nearBandFraction, stricter: "higher" },
};

/** SI value; null where the policy asks for none, undefined for lines that no policy speaks of. */
export function policyLimit(no: LineNo, site: SiteFacts): number | null | undefined {
  const line = policyLines[no];
  return line && (line.of(site) ?? null);
}

/** How a value set here stands to the policy's. */
export function againstPolicy(no: LineNo, si: number, site: SiteFacts): "same" | "stricter" | "looser" | undefined {
  const line = policyLines[no];
  const given = line?.of(site);
  if (!line || given === undefined) return undefined;
  if (Math.abs(si - given) <= 1e-9 * Math.abs(given)) return "same";
  return si < given === (line.stricter === "lower") ? "stricter" : "looser";
}
