/** Molar gas constant R [J/(mol K)], exact since the 2019 revision of the SI (CODATA 2018). */
export const gasConstant = 8.31446261815324;

/** Zero of enthalpy and entropy of every pure ideal gas. */
export const referenceTemperatureK = 298.15;
export const referencePressurePa = 100_000;
