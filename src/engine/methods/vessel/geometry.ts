import { EngineError } from "../../errors";
import { measureVessel, type MeasuredVessel } from "../../vessel/geometry";
import { headShapes } from "../../vessel/head";
import { gives, number, oneOf } from "../field";
import { defineMethod } from "../method";

const levelM = number("h", "Liquid level above the lowest inside point", "m", { min: 0, max: 1e3 });
const insideDiameterM = number("D", "Inside diameter", "m", { above: 0, max: 100 });
const outputs = {
  volumeM3: gives("V", "Inside volume", "m³"),
  innerAreaM2: gives("A", "Inside area", "m²"),
  liquidVolumeM3: gives("V_l", "Volume below the level", "m³"),
  wettedAreaM2: gives("A_w", "Inside area below the level", "m²"),
} as const;

function filled(vessel: MeasuredVessel, level: number) {
  const { volumeM3, innerAreaM2 = 0, heightM = 0, below } = vessel;
  if (level > heightM || !below)
    throw new EngineError("invalid-case", `The level is above the vessel's inside height, ${heightM} m.`, {}, "inputs.levelM");
  const { volumeM3: liquidVolumeM3, areaM2 } = below(level);
  return { volumeM3, innerAreaM2, liquidVolumeM3, wettedAreaM2: areaM2 };
}

export const cylinder = defineMethod({
  id: "vessel-cylinder",
  chapter: "vessel",
  title: "Volume and wetted area of a cylinder with heads",
  source: "Quadrature along the meridian of the heads of DIN 28011, DIN 28013, the flanged and dished head and the half ellipse",
  formula: String.raw`V_l=L\left[R^2\arccos\frac{R-h}{R}-(R-h)\sqrt{2Rh-h^2}\right]+2\,V_{head}(h)\quad\text{(lying)}`,
  inputs: {
    orientation: oneOf("Orientation", ["horizontal", "vertical"]),
    insideDiameterM,
    tangentLengthM: number("L", "Length between the tangent lines", "m", { min: 0, max: 1e4 }),
    heads: oneOf("Heads", headShapes),
    levelM,
  },
  outputs,
  evaluate: ({ levelM: level, ...shape }) => filled(measureVessel({ shape: "cylinder", ...shape }), level),
});

export const sphere = defineMethod({
  id: "vessel-sphere",
  chapter: "vessel",
  title: "Volume and wetted area of a sphere",
  source: "Spherical cap",
  formula: String.raw`V_l=\frac{\pi h^2}{3}(3R-h),\qquad A_w=\pi D h`,
  inputs: { insideDiameterM, levelM },
  outputs,
  evaluate: ({ insideDiameterM: D, levelM: level }) => filled(measureVessel({ shape: "sphere", insideDiameterM: D }), level),
});
