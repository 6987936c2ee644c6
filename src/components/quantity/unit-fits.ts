import type { UnitSystem } from "../units/unit-system";

const customary = /psi|°F|°R|^in|^ft|lb|bbl|Btu|^Cv/;
const neutral = new Set(["s", "min", "h", "–", "%"]);

/** Whether a unit belongs to a system; seconds and ratios belong to both. */
export const unitFits = (unit: string, system: UnitSystem): boolean =>
  neutral.has(unit) || customary.test(unit) === (system === "US");
