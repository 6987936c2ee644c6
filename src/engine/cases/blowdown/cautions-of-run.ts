/** Which cautions stand with this run. */
import {
  equationCaution,
  filmCaution,
  fireCaution,
  liquidCaution,
  oneTemperatureCaution,
  openingCaution,
  outsideDataCaution,
  screeningCaution,
  steelCaution,
  type Caution,
} from "../../cautions";
import type { BlowdownCase } from "../blowdown-case";
import type { Warning } from "../blowdown-result";
import type { Run } from "./integrate-run";

const cubic = ["van-der-waals", "redlich-kwong", "soave-redlich-kwong", "peng-robinson-1976", "peng-robinson-1978"];

export function cautionsOfRun({ fluid, heat, release, vessel, zones }: BlowdownCase, run: Run, warnings: Warning[]): Caution[] {
  const cautions = [screeningCaution, oneTemperatureCaution(heat.wall.model, zones === "separate" ? "separate" : "one")];
  const dew = run.phaseChanges.find((change) => change.to === "two-phase");
  const startsWet = run.segments[0]?.mode !== "one-phase";
  if (dew && !startsWet) cautions.push(liquidCaution(dew.temperatureK));
  if (warnings.some((warning) => warning.code === "outside-data-range")) cautions.push(outsideDataCaution);
  if (cubic.includes(fluid.equation)) cautions.push(equationCaution);
  if (heat.outside.model === "pool-fire" || heat.outside.model === "surface-fire") cautions.push(fireCaution);
  if (heat.inside.model !== "none") cautions.push(filmCaution);
  if (heat.wall.model !== "none" || vessel.wall?.minimumDesignMetalTemperatureK !== undefined) cautions.push(steelCaution);
  if (release.openingTimeS > 0) cautions.push(openingCaution);
  return cautions;
}
