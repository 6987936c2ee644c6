import { render, screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, it, vi } from "vitest";
import { CurveChart } from "./curve-chart";

// jsdom has no canvas; what is drawn on it is looked at in a browser. Here: what can be read without seeing it.
vi.mock("./curve-canvas", () => ({
  default: ({ summary }: { summary: string }) => <div role="img" aria-label={summary} />,
}));

const chart = {
  summary: "Pressure falls to its target in 13.6 minutes.",
  x: { name: "time", unit: "min", format: (value: number) => value.toFixed(1) },
  y: { name: "pressure", unit: "bar(g)", fromZero: true, format: (value: number) => value.toFixed(1) },
  series: [{ id: "p", label: "pressure", tone: "pressure" as const, x: [0, 10, 20], y: [80, 20, 10] }],
};

describe("CurveChart", () => {
  it("says what it shows in one sentence", async () => {
    render(<CurveChart {...chart} />);
    await waitFor(() => expect(screen.getByRole("img", { name: chart.summary })).toBeInTheDocument());
  });

  it("is read with the arrow keys", async () => {
    render(<CurveChart {...chart} />);
    await userEvent.tab();
    await userEvent.keyboard("{End}");
    expect(screen.getByRole("status")).toHaveTextContent("at 20.0 min, pressure 10.0 bar(g)");
    await userEvent.keyboard("{ArrowLeft}{ArrowLeft}{Escape}");
    expect(screen.getByRole("status")).toBeEmptyDOMElement();
  });

  it("keeps its figures one key away", async () => {
    render(<CurveChart {...chart} />);
    await userEvent.click(screen.getByText("Data"));
    const rows = within(await screen.findByRole("region", { name: "Data of pressure" })).getAllByRole("row");
    expect(rows.map((row) => row.textContent)).toEqual(["time, minpressure, bar(g)", "0.080.0", "10.020.0", "20.010.0"]);
  });

  it("shows axes alone while there are no curves yet", () => {
    render(<CurveChart {...chart} loading />);
    expect(screen.queryByRole("img")).toBeNull();
    expect(screen.queryByText("Data")).toBeNull();
  });
});
