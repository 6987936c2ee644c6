/** Every published method that can be evaluated on its own. A new one is a definition and a line here. */
import * as cold from "./cold/solids";
import * as discharge from "./discharge/gas";
import * as flame from "./disposal/flame";
import * as noise from "./disposal/noise";
import * as pipe from "./disposal/pipe";
import { ventGas } from "./disposal/vent-gas";
import * as blast from "./energy/blast";
import * as stored from "./energy/stored";
import * as fire from "./fire/fire";
import { cubicDepartures } from "./gas/cubic-departures";
import * as fractions from "./gas/petroleum-fractions";
import * as films from "./heat/films";
import * as transport from "./heat/transport";
import * as walls from "./heat/walls";
import type { Method } from "./method";
import * as devices from "./relief/devices";
import * as expansion from "./relief/expansion";
import { gasCritical, gasSubcritical } from "./relief/gas";
import { liquid, liquidViscosity } from "./relief/liquid";
import { omegaSubcooled, omegaTwoPhase, twoPhaseArea } from "./relief/omega";
import { steam } from "./relief/steam";
import * as vessel from "./vessel/geometry";

export const methods: readonly Method[] = [
  cubicDepartures,
  fractions.riaziDaubert1987,
  fractions.riaziDaubertFromBoilingPoint,
  fractions.keslerLeeFraction,
  vessel.cylinder,
  vessel.sphere,
  discharge.idealFlux,
  discharge.idealBlowdown,
  discharge.valveGas,
  films.verticalPlate,
  films.horizontalCylinder,
  films.turbulentNatural,
  films.crossFlow,
  films.cooper,
  films.rohsenow,
  films.criticalFlux,
  walls.overall,
  walls.slab,
  transport.lucas,
  transport.chung,
  transport.surfaceTension,
  cold.impactExemption,
  cold.carbonDioxideSublimation,
  cold.waterSaturation,
  cold.iceSublimation,
  cold.hydrate,
  cold.inhibitor,
  fire.poolFire,
  fire.insulation,
  fire.unwetted,
  fire.surfaceBalance,
  fire.nfpa,
  fire.curves,
  fire.hotStrength,
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
