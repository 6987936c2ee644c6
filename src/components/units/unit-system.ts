export const unitSystems = ["SI", "US"] as const;
/** The two systems a person can read in: SI, or US customary. */
export type UnitSystem = (typeof unitSystems)[number];

export const unitsCookie = "units";

export const readUnitSystem = (cookie: string | undefined): UnitSystem => unitSystems.find((system) => system === cookie) ?? "SI";
