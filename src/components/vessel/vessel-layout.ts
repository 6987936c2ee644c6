/** Where the views of the vessels stand on the page: one scale for all, side views and end views in a row. Pixels of the drawing's own box. */
import type { OutletPlace } from "@/engine/cases/blowdown-case";
import type { VesselShape } from "@/engine/vessel/geometry";
import { circle, profileOf, type Point, type Profile } from "./vessel-profile";

export type VesselItem = {
  tag: string;
  geometry: VesselShape;
  /** Above the lowest inside point; left out where nobody knows it. */
  levelM?: number | undefined;
};

export type View = {
  kind: "side" | "end" | "pipe";
  item: VesselItem;
  profile: Profile;
  outline: Point[];
  /** Left edge and the height of the lowest inside point. */
  x: number;
  bottom: number;
};

export type Layout = {
  pixelsPerM: number;
  views: View[];
  width: number;
  height: number; /** Line of the lowest inside points, and how far beneath it dimensions stand. */
  floor: number;
  underFloor: number;
};

export const drawingWidth = 800;
const tallest = 176;
const top = 44;
const gap = { side: 56, end: 84, first: 20 };
/** Vessels are never drawn larger than this, so that one small bottle does not fill the page. */
const largestScale = 900;

/**
 * outlet   one from the liquid needs room beneath
 * Returns  undefined where no item has a shape to draw
 */
export function layOut(items: readonly VesselItem[], outlet?: OutletPlace): Layout | undefined {
  const drawn = items.flatMap((item) => {
    const profile = profileOf(item.geometry);
    return profile ? [{ item, profile }] : [];
  });
  if (drawn.length === 0) return undefined;
  const widthM = drawn.reduce((sum, { profile }) => sum + profile.widthM + (profile.endViewM ?? 0), 0);
  const gaps = drawn.reduce((sum, { profile }) => sum + gap.end + (profile.endViewM ? gap.side : 0), gap.first);
  const heightM = Math.max(...drawn.map(({ profile }) => profile.heightM));
  const pixelsPerM = Math.min((drawingWidth - gaps) / widthM, tallest / heightM, largestScale);

  const underFloor = outlet === "liquid" ? 40 : 14;
  const floor = top + heightM * pixelsPerM;
  let x = gap.first;
  const views = drawn.flatMap(({ item, profile }) => {
    const side: View = { kind: "side", item, profile, outline: profile.outline, x, bottom: floor };
    x += profile.widthM * pixelsPerM + (profile.endViewM ? gap.side : gap.end);
    if (!profile.endViewM) return [side];
    const end: View = { kind: "end", item, profile, outline: circle(profile.endViewM), x, bottom: floor };
    x += profile.endViewM * pixelsPerM + gap.end;
    return [side, end];
  });
  return { pixelsPerM, views, width: drawingWidth, height: floor + underFloor + 48, floor, underFloor };
}

/** Length of the scale bar: the largest of 1, 2, 5 times a power of ten that is at most `longest`. */
export function barLength(longest: number): number {
  const power = 10 ** Math.floor(Math.log10(longest));
  const step = [5, 2, 1].find((factor) => factor * power <= longest) ?? 1;
  return step * power;
}
