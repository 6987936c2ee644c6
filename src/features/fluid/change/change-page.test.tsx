import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { stubWorker } from "../../../../tests/fixtures/engine-worker";
import { ChangePage } from "./change-page";

// jsdom has no canvas; the drawing is looked at in a browser.
vi.mock("@/components/charts/bridge-canvas", () => ({
  default: ({ summary }: { summary: string }) => <div role="img" aria-label={summary} />,
}));

const store = "change-of-state/test";
const address =
  "#z=methane%7E90%7Cpropane%7E10&eq=peng-robinson-1976&kij=library&from=70+bar%28a%29%3B35+%C2%B0C&to=15+bar%28a%29%3B-40+%C2%B0C";
const result = () => screen.findByRole("table", { name: "Steps of internal energy, enthalpy and entropy" }, { timeout: 5000 });

beforeEach(() => {
  stubWorker();
  localStorage.clear();
  window.history.replaceState(null, "", "/change-of-state");
});
afterEach(() => void vi.unstubAllGlobals());

describe("the change of state", () => {
  it("says what it waits for, and computes once composition and both states are typed", async () => {
    const user = userEvent.setup();
    render(<ChangePage store={store} />);
    expect(await screen.findByText("Add the components and their amounts.")).toBeVisible();
    await user.type(screen.getByRole("combobox", { name: /^Component to add/ }), "CO2{Enter}");
    await user.type(screen.getByRole("textbox", { name: "Carbon dioxide, mol %" }), "100");
    expect(await screen.findByText("Type pressure and temperature of both states.")).toBeVisible();
    for (const [name, text] of [
      ["Pressure, from", "60"],
      ["Temperature, from", "40"],
      ["Pressure, to", "1"],
      ["Temperature, to", "-20"],
    ] as const)
      await user.type(screen.getByRole("textbox", { name }), text);
    const rows = within(await result()).getAllByRole("row");
    expect(rows.map((row) => row.querySelector("th")?.textContent)).toEqual([
      "Step",
      "Departure out",
      "Ideal-gas change",
      "Departure back",
      "Change, sum of the steps",
    ]);
    expect(screen.getByText(/^Positive: at the first state the real fluid has .* less enthalpy/)).toBeVisible();
  });

  it("comes back from its address, and from the browser's store where the address holds nothing", async () => {
    const user = userEvent.setup();
    window.history.replaceState(null, "", `/change-of-state${address}`);
    const first = render(<ChangePage store={store} />);
    await result();
    const field = screen.getByRole("textbox", { name: "Temperature, to" });
    await user.clear(field);
    await user.type(field, "-35.0");
    await vi.waitFor(() => expect(localStorage.getItem(store)).toContain("-35.0"));
    expect(window.location.hash).toContain("-35.0");
    first.unmount();
    window.history.replaceState(null, "", "/change-of-state");
    render(<ChangePage store={store} />);
    expect(await screen.findByRole("textbox", { name: "Temperature, to" })).toHaveValue("-35.0");
    expect(screen.getByRole("textbox", { name: "Methane, mol %" })).toHaveValue("90");
  });

  it("lists every equation with its fitness, the one in use marked, and the spread of those that are fit", async () => {
    window.history.replaceState(null, "", `/change-of-state${address}`);
    render(<ChangePage store={store} />);
    const table = within(await screen.findByRole("table", { name: "Equations of state side by side" }, { timeout: 5000 }));
    const rows = table.getAllByRole("row").slice(1);
    expect(rows).toHaveLength(8);
    expect(rows[3]).toHaveTextContent(/Peng–Robinson 1976in use/);
    expect(rows[0]).toHaveTextContent("For comparison only");
    expect(rows[6]).toHaveTextContent("Does not apply");
    expect(rows[7]).toHaveTextContent(/Spread of those that are fit.* to /);
    expect(screen.queryByText(/NaN/)).toBeNull();
  });

  it("keeps the figures grey with a notice while something can't be read", async () => {
    const user = userEvent.setup();
    window.history.replaceState(null, "", `/change-of-state${address}`);
    render(<ChangePage store={store} />);
    await result();
    await user.type(screen.getByRole("textbox", { name: "Pressure, from" }), " bananas");
    expect(await screen.findByText("These figures belong to what stood before.")).toBeVisible();
    expect(screen.getByRole("alert")).toHaveTextContent(/is no unit of pressure/);
    expect(screen.queryByRole("button", { name: "Case file" })).toBeNull();
  });
});
