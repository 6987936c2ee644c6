import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { stubWorker } from "../../../../tests/fixtures/engine-worker";
import { FluidSheet } from "./fluid-sheet";
import type { FluidOfScreening } from "./fluid-of-screening";

vi.mock("@/components/charts/curve-canvas", () => ({
  default: ({ summary }: { summary: string }) => <div role="img" aria-label={summary} />,
}));

const subject: FluidOfScreening = {
  rows: [
    { id: "methane", reported: "84.5", moleFraction: 0.845 / 0.995 },
    { id: "propane", reported: "15.0", moleFraction: 0.15 / 0.995 },
  ],
  sum: 99.5,
  source: { kind: "sheet", note: "LR-0801" },
  fluid: {
    components: [
      { id: "methane", moleFraction: 0.845 / 0.995 },
      { id: "propane", moleFraction: 0.15 / 0.995 },
    ],
    equation: "soave-redlich-kwong",
    interaction: "library",
  },
  start: { temperatureK: 308.15, pressurePa: 70e5 },
  path: { pressurePa: [70e5, 20e5], temperatureK: [308.15, 230], vapourMoleFraction: [1, 0.9] },
  pathIsOlder: false,
};
const page = (given = subject) =>
  render(
    <FluidSheet
      titleBlock={null}
      subject={given}
      equationTitle="Soave–Redlich–Kwong 1972"
      edits="/form"
      changeHref="/change-of-state#x"
    />,
  );

beforeEach(() => {
  stubWorker();
  window.history.replaceState(null, "", "/fluid");
});
afterEach(() => void vi.unstubAllGlobals());

describe("the fluid of a screening", () => {
  it("shows what was reported beside what is used", async () => {
    page();
    const rows = within(screen.getByRole("table", { name: "Composition as reported and as used" })).getAllByRole("row");
    expect(rows[1]).toHaveTextContent(/Methane.*84\.5.*84\.925/);
    expect(rows.at(-1)).toHaveTextContent("99.500");
    expect(await screen.findByText("LR-0801")).toBeVisible();
  });

  it("draws start and path on the envelope, and says what they find", async () => {
    page();
    const chart = await screen.findByRole("img", { name: /critical point at/ }, { timeout: 5000 });
    expect(chart).toHaveAccessibleName(/the blowdown starts at 70\.0.bar\(a\), 35\.0.°C\..*least vapour share on it is 90\.0.%/);
    expect(screen.getByRole("rowheader", { name: "Start of the blowdown" })).toBeVisible();
  });

  it("gives the properties of both phases at the state typed, and grey ones never as current", async () => {
    const user = userEvent.setup();
    page();
    await screen.findByText(/^(Vapour|Supercritical)\.$/, {}, { timeout: 5000 });
    const pressure = screen.getByRole("textbox", { name: "Pressure, state" });
    const temperature = screen.getByRole("textbox", { name: "Temperature, state" });
    await user.clear(pressure);
    await user.type(pressure, "290 psia");
    await user.clear(temperature);
    await user.type(temperature, "-40");
    await user.tab();
    expect(await screen.findByText(/^Vapour and liquid, \d\d\.\d.% vapour by mole\.$/, {}, { timeout: 5000 })).toBeVisible();
    expect(screen.getByRole("combobox", { name: "Unit of Pressure, state" })).toHaveValue("psia");
    expect(pressure).toHaveValue("290");
    expect(screen.getByRole("table", { name: "Composition of the phases" })).toBeVisible();
    expect(screen.queryByText(/NaN/)).toBeNull();
  });

  it("says why nothing is computed", () => {
    const { fluid: _fluid, start: _start, path: _path, ...rest } = subject;
    page({ ...rest, sum: 80 });
    expect(screen.getByText("Nothing is computed.")).toBeVisible();
    expect(screen.getByRole("link", { name: "Settle line 3.01." })).toHaveAttribute("href", "/form");
  });
});
