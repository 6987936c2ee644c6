/** The balances that a model asks for: one temperature, or one for vapour and one for liquid. */
import { Balance } from "./balance";
import type { VesselModel } from "./vessel-model";
import { ZonedBalance } from "./zones/zoned-balance";

export const makeBalance = (model: VesselModel): Balance =>
  model.zones ? new ZonedBalance(model, model.zones) : new Balance(model);
