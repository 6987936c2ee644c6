import type { FluidModel } from "../eos/fluid-model";
import { findLibraryRow } from "../substances/library";
import { brockBirdSurfaceTension } from "../transport/surface-tension";

/** Liquids that the correlation was not made for. */
const polar = new Set(["water", "methanol", "ammonia"]);

/**
 * Surface tension of a liquid mixture as the mole-fraction mean of its components' own, each by Brock and Bird; components above their
 * critical temperature count as zero.
 *
 * Source   transport/surface-tension.ts for the components; the plain mean is a screening choice, ours.
 * Returns  σ [N/m]; undefined where less than half of the liquid, by mole, is non-polar and in the library
 */
export function liquidSurfaceTension(model: FluidModel, x: ArrayLike<number>, temperatureK: number): number | undefined {
  let sum = 0;
  let known = 0;
  model.componentIds.forEach((id, i) => {
    const row = polar.has(id) ? undefined : findLibraryRow(id);
    if (!row) return;
    known += x[i]!;
    sum +=
      x[i]! *
      brockBirdSurfaceTension(
        { criticalTemperatureK: row.Tc_K, criticalPressurePa: row.Pc_Pa, normalBoilingPointK: row.normalBoilingPoint_K },
        temperatureK,
      );
  });
  return known > 0.5 ? sum / known : undefined;
}
