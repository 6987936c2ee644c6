/** What the sign of each step of a change of state says, in words. */
import type { ThreeSteps } from "@/engine/cases/path-case";

export type Property = "enthalpyJPerMol" | "internalEnergyJPerMol" | "entropyJPerMolK";
export type StepKey = keyof ThreeSteps;

export const properties: { key: Property; name: string; symbol: string; quantity: "molarEnergy" | "molarEntropy" }[] = [
  { key: "internalEnergyJPerMol", name: "Internal energy", symbol: "U", quantity: "molarEnergy" },
  { key: "enthalpyJPerMol", name: "Enthalpy", symbol: "H", quantity: "molarEnergy" },
  { key: "entropyJPerMolK", name: "Entropy", symbol: "S", quantity: "molarEntropy" },
];

export const stepNames: Record<StepKey, string> = {
  departureOut: "Departure out",
  idealGas: "Ideal-gas change",
  departureBack: "Departure back",
  total: "Change, sum of the steps",
};
export const stepKeys = Object.keys(stepNames) as StepKey[];

/** Below this a step is no more than round-off beside the others. */
const roundOff = 1e-9;

/**
 * One sentence: the sign, and what it means at this step.
 *
 * value   of the step, SI
 * size    the value without its sign, written with its unit
 * scale   largest of the steps, SI, against which a value counts as nothing
 */
export function stepSentence(
  step: StepKey,
  property: Property,
  { value, size, scale }: { value: number; size: string; scale: number },
): string {
  const what = properties.find(({ key }) => key === property)?.name.toLowerCase() ?? "value";
  if (!(Math.abs(value) > roundOff * Math.max(scale, 1e-6))) return nothing[step];
  const plus = value > 0;
  const sign = plus ? "Positive" : "Negative";
  switch (step) {
    case "departureOut":
      return `${sign}: at the first state the real fluid has ${size} ${plus ? "less" : "more"} ${what} than the ideal gas at the same temperature and pressure.`;
    case "idealGas":
      return `${sign}: as an ideal gas it ${plus ? "gains" : "loses"} ${size} of ${what} from the first to the second ${property === "entropyJPerMolK" ? "temperature and pressure" : "temperature"}; ${property === "entropyJPerMolK" ? "both count" : "pressure does not count"}.`;
    case "departureBack":
      return `${sign}: at the second state the real fluid has ${size} ${plus ? "more" : "less"} ${what} than the ideal gas at the same temperature and pressure.`;
    case "total":
      return `${sign}: the fluid ends with ${size} ${plus ? "more" : "less"} ${what} than it began with.`;
  }
}

const nothing: Record<StepKey, string> = {
  departureOut: "Zero: at the first state the real fluid is as the ideal gas.",
  idealGas: "Zero: the ideal gas does not change.",
  departureBack: "Zero: at the second state the real fluid is as the ideal gas.",
  total: "Zero: the fluid ends as it began.",
};
