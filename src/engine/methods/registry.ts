/** Every published method that can be evaluated on its own. A new one is a definition and a line here. */
import * as flame from "./disposal/flame";
import * as noise from "./disposal/noise";
import * as pipe from "./disposal/pipe";
import { ventGas } from "./disposal/vent-gas";
import * as blast from "./energy/blast";
import * as stored from "./energy/stored";
import type { Method } from "./method";
import * as devices from "./relief/devices";
import * as expansion from "./relief/expansion";
import { gasCritical, gasSubcritical } from "./relief/gas";
import { liquid, liquidViscosity } from "./relief/liquid";
import { omegaSubcooled, omegaTwoPhase, twoPhaseArea } from "./relief/omega";
import { steam } from "./relief/steam";

export const methods: readonly Method[] = [
  devices.accumulatedPressure,
  gasCritical,
  gasSubcritical,
  steam,
  liquid,
  liquidViscosity,
  omegaTwoPhase,
  omegaSubcooled,
  twoPhaseArea,
  devices.orificeDesignation,
  devices.backPressureFactor,
  devices.isoGas,
  devices.isoLiquid,
  devices.reactionForce,
  expansion.thermalExpansion,
  expansion.blockedInRise,
  stored.brode,
  stored.isentropic,
  stored.isothermal,
  stored.availability,
  stored.pressureTest,
  stored.tntEquivalent,
  blast.freeAir,
  blast.surface,
  blast.surfaceDistance,
  pipe.outletMach,
  pipe.chokedPressure,
  pipe.headerInlet,
  pipe.friction,
  ventGas,
  flame.radiation,
  flame.radiationDistance,
  flame.airTransmissivity,
  flame.flameLength,
  noise.ventNoise,
  noise.addedNoise,
];

const byId = new Map(methods.map((method) => [method.id, method]));

export const findMethod = (id: string): Method | undefined => byId.get(id);
