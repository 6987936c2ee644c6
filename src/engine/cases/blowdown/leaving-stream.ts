/**
 * The streams that leave, at rest before the opening: vapour, liquid, or everything as it is mixed in the vessel.
 *
 * A liquid outlet uncovers as the last hundredth of the vessel's volume of liquid goes, and a vapour outlet is still splashed while vapour
 * fills less than a ten-thousandth: the opening is then shared between liquid and vapour in proportion. Switching at once from one to the other
 * would chatter for ever, because saturated vapour that expands makes a little liquid, and a full vessel that vents vapour is warmed full again.
 */
import type { FluidModel, PhaseState } from "../../eos/fluid-model";
import { assemble } from "../../flash/assemble";
import type { Equilibrium } from "../../flash/equilibrium";
import type { OutletPlace } from "../blowdown-case";
import type { Contents } from "./contents";

export type LeavingStream = {
  /** Part of the opening that it has to itself. */
  share: number;
  composition: Float64Array;
  temperatureK: number;
  pressurePa: number;
  enthalpyJPerMol: number;
  /** The one phase it consists of; undefined for a mixture of two. */
  phase: PhaseState | undefined;
  isLiquid: boolean;
  /** The same as an equilibrium, made when asked for. */
  equilibrium: () => Equilibrium;
};

const uncoveredBelow = 0.01;
const splashedBelow = 1e-4;

export function leavingStreams(fluid: FluidModel, contents: Contents, from: OutletPlace, volumeM3: number): LeavingStream[] {
  const { equilibrium, lightest, lightestComposition, isLiquidFull, liquidVolumeM3 } = contents;
  const dense = equilibrium?.phases[1];
  const light = onePhase(fluid, contents, {
    phase: lightest,
    composition: lightestComposition,
    isLiquid: isLiquidFull,
    share: 1,
  });
  if (!equilibrium || !dense) return [light];
  if (from === "whole") {
    const { temperatureK, pressurePa, composition } = contents;
    const { enthalpyJPerMol } = equilibrium;
    return [
      {
        share: 1,
        composition,
        temperatureK,
        pressurePa,
        enthalpyJPerMol,
        phase: undefined,
        isLiquid: false,
        equilibrium: () => equilibrium,
      },
    ];
  }
  const covered =
    from === "liquid"
      ? Math.min(liquidVolumeM3 / (uncoveredBelow * volumeM3), 1)
      : Math.max(1 - (volumeM3 - liquidVolumeM3) / (splashedBelow * volumeM3), 0);
  if (covered <= 0) return [light];
  const liquid = onePhase(fluid, contents, {
    phase: dense.state,
    composition: dense.composition,
    isLiquid: true,
    share: covered,
  });
  return covered === 1 ? [liquid] : [liquid, { ...light, share: 1 - covered }];
}

type OnePhase = { phase: PhaseState; composition: Float64Array; isLiquid: boolean; share: number };

function onePhase(fluid: FluidModel, { pressurePa }: Contents, { phase, composition, isLiquid, share }: OnePhase): LeavingStream {
  const { temperatureK } = phase;
  return {
    share,
    composition,
    temperatureK,
    pressurePa,
    enthalpyJPerMol: phase.enthalpyJPerMol,
    phase,
    isLiquid,
    equilibrium: () =>
      assemble(fluid, temperatureK, pressurePa, [{ moleFraction: 1, composition, molarVolume: phase.molarVolumeM3PerMol }]),
  };
}
