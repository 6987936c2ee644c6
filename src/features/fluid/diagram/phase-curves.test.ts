import { describe, expect, it } from "vitest";
import { createFluidModel } from "@/engine/eos/create-fluid-model";
import { phaseEnvelope, type PhaseEnvelope } from "@/engine/flash/phase-envelope";
import { flashPQ } from "@/engine/flash/flash-quality";
import { diagramNotes, diagramSummary } from "./diagram-words";
import { dewTemperatureAt, drawDiagram } from "./phase-curves";

const model = createFluidModel({
  components: [
    { id: "methane", moleFraction: 0.85 },
    { id: "propane", moleFraction: 0.15 },
  ],
  equation: "peng-robinson-1976",
});
const envelope = phaseEnvelope(model);
const start = { temperatureK: 300, pressurePa: 70e5 };
const path = { pressurePa: [70e5, 30e5, 10e5], temperatureK: [300, 240, 260], vapourMoleFraction: [1, 0.93, 1] };
const input = { envelope, lines: null, pure: false, start, path };
const write = { temperature: (si: number) => `${si.toFixed(1)} K`, pressure: (si: number) => `${(si / 1e5).toFixed(1)} bar` };

describe("the diagram of a fluid", () => {
  it("has both lines to the critical point, the path over them, and the points that matter", () => {
    const { lines, marks, points } = drawDiagram(input, "SI");
    expect(lines.map(({ label }) => label)).toEqual(["dew line", "bubble line", "blowdown"]);
    expect(lines[0]?.points.at(-1)).toEqual(lines[1]?.points[0]);
    expect(marks.map(({ label }) => label.split(" ")[0])).toEqual(["critical", "cricondentherm", "cricondenbar", "start"]);
    expect(points.at(-1)).toEqual({
      name: "Start of the blowdown",
      at: "70.0 bar(a), 26.9 °C".replaceAll(/ (?=bar|°)/g, "\u00a0"),
    });
  });

  it("carries the figures at the marks where no table stands beside it", () => {
    const labels = (figuresAtMarks: boolean) => drawDiagram({ ...input, figuresAtMarks }, "SI").marks.map(({ label }) => label);
    expect(labels(false)).toContain("cricondentherm");
    expect(labels(true)[1]).toMatch(/^cricondentherm .*°C$/);
  });

  it("follows the system of units", () => {
    const { x, y, lines } = drawDiagram(input, "US");
    expect([x.unit, y.unit]).toEqual(["°F", "psia"]);
    expect(lines[2]?.points[0]?.y).toBeCloseTo(1015.26, 1);
  });

  it("marks another state only where it is another", () => {
    const labels = (state: typeof start) => drawDiagram({ ...input, state }, "SI").marks.map(({ label }) => label);
    expect(labels(start)).not.toContain("state");
    expect(labels({ ...start, temperatureK: 280 })).toContain("state");
  });

  it("of a pure fluid has one line", () => {
    const pure = phaseEnvelope(
      createFluidModel({ components: [{ id: "propane", moleFraction: 1 }], equation: "peng-robinson-1976" }),
    );
    expect(drawDiagram({ envelope: pure, lines: null, pure: true }, "SI").lines.map(({ label }) => label)).toEqual([
      "vapour pressure",
    ]);
  });
});

describe("the words beside it", () => {
  it("say what the path does and which line is missing", () => {
    const lines = { shares: [], withoutHydrate: "There is no water.", solidCarbonDioxide: [] };
    expect(diagramNotes({ ...input, lines }, write)).toEqual([
      expect.stringContaining("least vapour share on it is 93.0\u00a0%"),
      "There is no water.",
    ]);
    expect(diagramNotes({ ...input, path: { ...path, vapourMoleFraction: [1, 1, 1] } }, write)[0]).toMatch(/stays one phase/);
  });

  it("say that liquid water can stand outside the lines", () => {
    expect(diagramNotes({ ...input, wet: true }, write).join(" ")).toMatch(/liquid water can stand outside/);
    expect(diagramNotes(input, write).join(" ")).not.toMatch(/water/);
  });

  it("never let a line that was lost pass for its end", () => {
    const lost: PhaseEnvelope = { ...envelope, endedBy: "lost" };
    expect(diagramNotes({ ...input, envelope: lost }, write)[0]).toMatch(/the next point was not found/);
  });

  it("find in one sentence", () => {
    expect(diagramSummary(input, write)).toMatch(
      /^Bubble and dew line up to the critical point at .*; the blowdown starts at 70.0 bar, 300.0 K\./,
    );
  });
});

it("reads the first liquid on cooling from the dew line as a saturation calculation finds it", () => {
  expect(dewTemperatureAt(envelope, 40e5)).toBeCloseTo(
    flashPQ(model, { pressurePa: 40e5, vapourMoleFraction: 1 }).temperatureK,
    0,
  );
  expect(dewTemperatureAt(envelope, 500e5)).toBeUndefined();
});
