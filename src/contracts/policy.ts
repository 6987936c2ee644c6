/** A facility's limit policy: what a screening is held against unless a line of part 7 says otherwise. SI, pressures absolute. */
import { z } from "zod";

export const limitPolicySchema = z.strictObject({
  name: z.string().min(1).max(40),
  rev: z.int().min(1),
  targetTimeS: z.number().positive().max(86400),
  /** Gauge, against the site's barometric pressure. */
  targetPressurePaGauge: z.number().positive().max(1e8),
  minimumMetalMarginK: z.number().min(0).max(100),
  ventCapacityKgPerS: z.number().positive().max(1e5).optional(),
  minimumOutletTemperatureK: z.number().positive().max(900).optional(),
  /** The near band; policy may only widen the default of 10 K and 10 %. */
  nearBandK: z.number().min(10).max(100),
  nearBandFraction: z.number().min(0.1).max(1),
});

export type LimitPolicy = z.infer<typeof limitPolicySchema>;

/** 6.9 bar(g) within 15 minutes: common practice for depressuring, after API Std 521; the site's own basis governs. */
export const defaultPolicy: LimitPolicy = {
  name: "LP-1",
  rev: 1,
  targetTimeS: 900,
  targetPressurePaGauge: 690000,
  minimumMetalMarginK: 0,
  nearBandK: 10,
  nearBandFraction: 0.1,
};
