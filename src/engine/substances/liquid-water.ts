/**
 * Density of saturated liquid water [kg/m³].
 *
 *   ρ/ρc = 1 + b1 τ^(1/3) + b2 τ^(2/3) + b3 τ^(5/3) + b4 τ^(16/3) + b5 τ^(43/3) + b6 τ^(110/3),   τ = 1 − T/Tc
 *
 * Source   Wagner and Pruss, J. Phys. Chem. Ref. Data 22 (1993) 783; IAPWS SR1-86(1992), eq. 2.
 * Holds    273.16 to 647.096 K; colder, the value at 273.16 K is given (supercooled water down to 253 K is within 1 % of it). Pressure adds
 *          0.5 % in 100 bar.
 * Checks   liquid-water.test.ts
 */
export function saturatedWaterDensity(temperatureK: number): number {
  const tau = 1 - Math.min(Math.max(temperatureK, 273.16), 647.096) / 647.096;
  const third = Math.cbrt(tau);
  return (
    322 *
    (1 +
      1.99274064 * third +
      1.09965342 * third ** 2 -
      0.510839303 * third ** 5 -
      1.75493479 * third ** 16 -
      45.5170352 * third ** 43 -
      6.7469445e5 * third ** 110)
  );
}
