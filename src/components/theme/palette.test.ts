import { describe, expect, it } from "vitest";
import { palette, type ColourName } from "./palette";

/** Relative luminance and contrast ratio as WCAG 2.2 defines them. */
const luminance = (hex: string): number => {
  const [r = 0, g = 0, b = 0] = [1, 3, 5]
    .map((at) => parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
};
const contrast = (a: string, b: string): number => {
  const [low = 0, high = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (high + 0.05) / (low + 0.05);
};

const text = 4.5;
const graphic = 3;
const pairs: [ColourName, ColourName, number][] = [
  ...(["ink", "ink-2", "ink-3", "tide"] as const).flatMap((ink): [ColourName, ColourName, number][] => [
    [ink, "sheet", text],
    [ink, "tint", text],
  ]),
  ["ink-3", "tide-wash", text],
  ["ink", "near-wash", text],
  ["ink", "beyond-wash", text],
  ["ink", "tide-wash", text],
  ["on-tide", "tide-deep", text],
  ...(["within", "near", "beyond", "open"] as const).flatMap((verdict): [ColourName, ColourName, number][] => [
    [verdict, "sheet", text],
    [verdict, "tint", text],
    [verdict, `${verdict}-wash`, text],
  ]),
  ...(["c-pressure", "c-fluid", "c-wall", "c-limit", "c-vent"] as const).flatMap((line): [ColourName, ColourName, number][] => [
    [line, "sheet", text],
    [line, "tint", text],
  ]),
  ["c-ghost", "sheet", graphic],
  ["c-ghost", "tint", graphic],
  ["rule-3", "field", graphic],
  ["rule-3", "tint", graphic],
];

describe.each(["light", "dark"] as const)("the %s palette", (theme) => {
  it.each(pairs)("keeps %s on %s at a contrast of %d or more", (front, back, needed) => {
    expect(contrast(palette[theme][front], palette[theme][back])).toBeGreaterThanOrEqual(needed);
  });
});

it("measures contrast as WCAG does: black on white is 21, mid grey #767676 on white is 4.54", () => {
  expect(contrast("#000000", "#FFFFFF")).toBeCloseTo(21, 6);
  expect(contrast("#767676", "#FFFFFF")).toBeCloseTo(4.54, 2);
});
