import { render, screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, it, vi } from "vitest";
import { PhaseChart } from "./phase-chart";

// jsdom has no canvas; what is drawn on it is looked at in a browser. Here: what can be read without seeing it.
vi.mock("./curve-canvas", () => ({
  default: ({ summary }: { summary: string }) => <div role="img" aria-label={summary} />,
}));

const chart = {
  summary: "The dew line turns back at 30 °C.",
  x: { name: "temperature", unit: "°C", format: (value: number) => value.toFixed(1) },
  y: { name: "pressure", unit: "bar(a)", fromZero: true, format: (value: number) => value.toFixed(1) },
  lines: [
    {
      id: "dew",
      label: "dew line",
      tone: "dew" as const,
      points: [
        { x: -20, y: 1 },
        { x: 30, y: 51 },
        { x: 10, y: 91 },
      ],
    },
    {
      id: "bubble",
      label: "bubble line",
      tone: "bubble" as const,
      points: [
        { x: 10, y: 91 },
        { x: -30, y: 11 },
      ],
    },
  ],
};

describe("PhaseChart", () => {
  it("reads every branch of a line that turns back, with the arrow keys", async () => {
    render(<PhaseChart {...chart} />);
    await waitFor(() => expect(screen.getByRole("img", { name: chart.summary })).toBeInTheDocument());
    await userEvent.tab();
    await userEvent.keyboard("{End}{ArrowLeft>20/}");
    // 100 steps over the range of −30 to 30 °C: twenty of them lead to 18 °C.
    expect(screen.getByRole("status")).toHaveTextContent("at 18.0 °C, dew line 39.0 bar(a), dew line 75.0 bar(a)");
  });

  it("keeps the points of each line one key away", async () => {
    render(<PhaseChart {...chart} />);
    await userEvent.click(screen.getByText("Data"));
    const region = within(await screen.findByRole("region", { name: /^Data of the diagram/ }));
    expect(region.getByRole("table", { name: "dew line, 3 points" })).toBeInTheDocument();
    expect(region.getAllByRole("row").at(-1)).toHaveTextContent("−30.011.0".replace("−", "-"));
  });
});
