import { createFacilitySchema, type CreateFacility } from "@/contracts/requests";
import { defaultPolicy } from "@/contracts/policy";
import { readQuantity } from "@/engine/read-quantity";
import { standardAtmospherePa, type QuantityId } from "@/engine/units";

/** A facility as typed: each figure with a unit, or without one in the unit named beside its field. */
export type FacilityForm = {
  code: string;
  name: string;
  barometricPressure: string;
  policyName: string;
  targetTime: string;
  targetPressure: string;
  metalMargin: string;
  outletTemperature: string;
  ventCapacity: string;
};

export type FigureField = keyof Omit<FacilityForm, "code" | "name" | "policyName">;

export const figureFields: Record<
  FigureField,
  { label: string; quantity: QuantityId; unit: string; optional?: true; hint?: string }
> = {
  barometricPressure: {
    label: "Barometric pressure of the site",
    quantity: "pressure",
    unit: "bar(a)",
    hint: "Gauge readings of the site count from it.",
  },
  targetTime: { label: "Time to target pressure, at most", quantity: "time", unit: "min" },
  targetPressure: { label: "Target pressure", quantity: "pressure", unit: "bar(g)" },
  metalMargin: { label: "Steel above its rated temperature", quantity: "temperatureDifference", unit: "K" },
  outletTemperature: {
    label: "Fluid leaving the opening, not colder than",
    quantity: "temperature",
    unit: "°C",
    optional: true,
    hint: "May stay empty: no limit.",
  },
  ventCapacity: {
    label: "Peak vent load, at most",
    quantity: "massRate",
    unit: "kg/s",
    optional: true,
    hint: "May stay empty: no limit.",
  },
};

export const emptyFacility: FacilityForm = {
  code: "",
  name: "",
  barometricPressure: "1.01325",
  policyName: defaultPolicy.name,
  targetTime: "15",
  targetPressure: "6.9",
  metalMargin: "0",
  outletTemperature: "",
  ventCapacity: "",
};

export type FacilityProblems = Partial<Record<keyof FacilityForm, string>>;

/** What is to be sent, or what is wrong by field. The near band starts at its default; a policy may only widen it. */
export function readFacility(form: FacilityForm): { facility: CreateFacility } | { problems: FacilityProblems } {
  const problems: FacilityProblems = {};
  const figure = (field: FigureField, barometricPressurePa?: number): number | undefined => {
    const { quantity, unit, optional } = figureFields[field];
    if (form[field].trim() === "" && optional) return undefined;
    const read = readQuantity(form[field], {
      quantity,
      unit,
      ...(barometricPressurePa === undefined ? {} : { barometricPressurePa }),
    });
    if (!read.ok) problems[field] = `Write a number, in ${unit} or with its unit.`;
    return read.ok ? read.si : undefined;
  };
  const barometric = figure("barometricPressure");
  const target = figure("targetPressure", barometric ?? standardAtmospherePa);
  const outlet = figure("outletTemperature");
  const vent = figure("ventCapacity");
  const candidate = {
    code: form.code,
    name: form.name,
    barometricPressurePa: barometric,
    policy: {
      name: form.policyName.trim(),
      rev: 1,
      targetTimeS: figure("targetTime"),
      targetPressurePaGauge: target === undefined ? undefined : target - (barometric ?? standardAtmospherePa),
      minimumMetalMarginK: figure("metalMargin"),
      ...(outlet === undefined ? {} : { minimumOutletTemperatureK: outlet }),
      ...(vent === undefined ? {} : { ventCapacityKgPerS: vent }),
      nearBandK: defaultPolicy.nearBandK,
      nearBandFraction: defaultPolicy.nearBandFraction,
    },
  };
  const parsed = createFacilitySchema.safeParse(candidate);
  if (parsed.success && Object.keys(problems).length === 0) return { facility: parsed.data };
  for (const { path } of parsed.error?.issues ?? []) {
    const field = fieldOf[path.join(".")];
    if (field && !problems[field]) problems[field] = rangeWords[field];
  }
  return { problems };
}

const fieldOf: Record<string, keyof FacilityForm> = {
  code: "code",
  name: "name",
  barometricPressurePa: "barometricPressure",
  "policy.name": "policyName",
  "policy.targetTimeS": "targetTime",
  "policy.targetPressurePaGauge": "targetPressure",
  "policy.minimumMetalMarginK": "metalMargin",
  "policy.minimumOutletTemperatureK": "outletTemperature",
  "policy.ventCapacityKgPerS": "ventCapacity",
};

const rangeWords: Record<keyof FacilityForm, string> = {
  code: "A code has 2 to 8 letters or digits, such as VR.",
  name: "Give the facility a name, up to 80 characters.",
  barometricPressure: "Between 0.5 and 1.1 bar(a).",
  policyName: "Give the policy a name, up to 40 characters.",
  targetTime: "More than 0 and up to 1440 min.",
  targetPressure: "Above 0 bar(g), up to 1000.",
  metalMargin: "Between 0 and 100 K.",
  outletTemperature: "Above −273.15 °C, up to 626.",
  ventCapacity: "More than 0 and up to 100000 kg/s.",
};
