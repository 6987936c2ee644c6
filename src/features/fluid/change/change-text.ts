/** A change of state as plain text that can be cited: what it rests on, the steps, and the caution that stands with it. */
import { formatMolePercent, formatQuantity, plainText } from "@/components/quantity/format";
import { shownAbsolutePressure, shownUnit } from "@/components/quantity/shown-units";
import type { UnitSystem } from "@/components/units/unit-system";
import { componentName } from "@/contracts/component-list";
import { equationTitles } from "@/contracts/equation-titles";
import { screeningCaution } from "@/engine/cautions";
import type { PathCase } from "@/engine/cases/path-case";
import type { StateProperties } from "@/engine/properties/state-properties";
import type { ChangeAnswer } from "@/workers/fluid-asks";
import { stateWords } from "../state/phase-words";
import { properties, stepKeys, stepNames } from "./step-words";

/** date   the day it was computed, in words */
export function changeText(
  document: PathCase,
  { result, from, to }: ChangeAnswer,
  { system, date }: { system: UnitSystem; date: string },
): string {
  const { fluid } = document;
  const state = (at: StateProperties) =>
    [
      formatQuantity("pressure", at.pressurePa, shownAbsolutePressure[system]).text,
      formatQuantity("temperature", at.temperatureK, shownUnit("temperature", system)).text,
      stateWords(at).toLowerCase(),
    ].join(", ");
  const lines = [
    `Change of state by departure functions, ${date}`,
    `Equation: ${equationTitles[fluid.equation]}, binary interaction ${fluid.interaction === "none" ? "none" : "as published"}`,
    `Composition, mol %: ${fluid.components.map(({ id, moleFraction }) => `${componentName(id)} ${formatMolePercent(moleFraction)}`).join(", ")}`,
    `From: ${state(from)}`,
    `To:   ${state(to)}`,
    "",
    ...properties.flatMap(({ key, name, quantity }) => {
      const unit = shownUnit(quantity, system);
      return [
        `${name}, ${unit}`,
        ...stepKeys.map(
          (step) => `  ${stepNames[step]}: ${formatQuantity(quantity, result[key][step], unit, { signed: true }).number}`,
        ),
      ];
    }),
    "",
    ...[...new Set(result.warnings.map(({ message }) => message))].map((message) => `Note: ${message}`),
    `${screeningCaution.id} ${screeningCaution.words}`,
  ];
  return plainText(lines.join("\n"));
}
