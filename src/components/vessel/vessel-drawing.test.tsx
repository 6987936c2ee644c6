import { render, screen } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import type { VesselShape } from "@/engine/vessel/geometry";
import { UnitsProvider } from "../units/units-provider";
import { VesselDrawing } from "./vessel-drawing";
import { barLength, layOut } from "./vessel-layout";

const drum: VesselShape = {
  shape: "cylinder",
  orientation: "horizontal",
  insideDiameterM: 1.8,
  tangentLengthM: 6,
  heads: "ellipsoidal-2-1",
};

describe("the drawn vessel", () => {
  it("says in words what it shows", () => {
    render(
      <UnitsProvider initial="SI">
        <VesselDrawing items={[{ tag: "V-2101", geometry: drum, levelM: 0.36 }]} outlet="liquid" />
      </UnitsProvider>,
    );
    expect(screen.getByRole("img").getAttribute("aria-label")).toBe(
      "To scale. V-2101: a horizontal cylinder of 1.800\u00a0m inside diameter, 6.000\u00a0m between tangents, 2:1 ellipsoidal heads, liquid to 0.360\u00a0m. The outlet leaves from the liquid.",
    );
  });

  it("shows side and end view, tangent length, level zones and the scale, without a style attribute", () => {
    const { container } = render(
      <UnitsProvider initial="US">
        <VesselDrawing items={[{ tag: "V-2101", geometry: drum, levelM: 0.36 }]} outlet="vapour" />
      </UnitsProvider>,
    );
    expect(container.querySelectorAll("[style]")).toHaveLength(0);
    expect(container.textContent).toMatch(/19\.69\sft between tangents.*V-2101.*vapour out.*end view.*5\.91\sft.*ft, one scale/);
    expect(container.querySelectorAll("path[stroke-dasharray='9 3']")).toHaveLength(2);
  });

  it("draws nothing for a plain volume", () => {
    const { container } = render(
      <UnitsProvider initial="SI">
        <VesselDrawing items={[{ tag: "B", geometry: { shape: "volume", volumeM3: 1 } }]} />
      </UnitsProvider>,
    );
    expect(container.innerHTML).toBe("");
  });
});

describe("the layout of a drawing", () => {
  const sphere = (insideDiameterM: number): VesselShape => ({ shape: "sphere", insideDiameterM });

  it.each([
    ["one drum", [drum]],
    ["a long drum", [{ ...drum, tangentLengthM: 20 }]],
    ["a thin tall column", [{ ...drum, orientation: "vertical" as const, tangentLengthM: 24 }]],
    ["a bottle", [{ ...drum, insideDiameterM: 0.05, tangentLengthM: 0.3, orientation: "vertical" as const }]],
    ["a sphere of 20 m", [sphere(20)]],
    ["four unequal vessels", [drum, sphere(2), { ...drum, orientation: "vertical" as const }, sphere(0.5)]],
  ] as [string, VesselShape[]][])("keeps every view of %s inside the page, none upon another", (_name, geometries) => {
    const layout = layOut(geometries.map((geometry, i) => ({ tag: `V-${i}`, geometry })));
    if (!layout) throw new Error("nothing is drawn");
    const boxes = layout.views.map(({ x, outline }) => ({
      from: x,
      to: x + Math.max(...outline.map((point) => point.x)) * layout.pixelsPerM,
      top: layout.floor - Math.max(...outline.map((point) => point.y)) * layout.pixelsPerM,
    }));
    boxes.forEach(({ from, to, top }, i) => {
      expect(from).toBeGreaterThanOrEqual(i === 0 ? 0 : (boxes[i - 1]?.to ?? 0) + 40);
      expect(to).toBeLessThanOrEqual(layout.width);
      expect(top).toBeGreaterThan(30);
    });
  });

  it.each([
    [3.4, 2],
    [7, 5],
    [0.14, 0.1],
    [19.9, 10],
    [20, 20],
  ])("takes for %s a bar of %s", (longest, bar) => expect(barLength(longest)).toBeCloseTo(bar, 12));
});
