import { render, screen, within } from "@testing-library/react";
import { expect, it } from "vitest";
import { EbbThumb } from "./ebb-thumb";
import { LimitTable } from "./limit-table";
import { ShareBar } from "./share-bar";

it("says in words what is missing, and which row governs", () => {
  render(
    <LimitTable
      caption="Limits"
      rows={[
        {
          no: "A7.02",
          title: "Lowest inner wall",
          computed: "−27.2 °C",
          limit: "not below −29.0 °C",
          inHand: "1.8 K",
          share: 0.97,
          verdict: "near",
          governs: true,
        },
        {
          no: "A7.04",
          title: "Vent load",
          computed: null,
          limit: null,
          inHand: null,
          share: null,
          verdict: "open",
          governs: false,
        },
      ]}
    />,
  );
  const [, governing, open] = screen.getAllByRole("row");
  expect(governing).toHaveTextContent("governs");
  expect(governing).toHaveTextContent("Near");
  expect(open).not.toHaveTextContent("governs");
  expect(within(open!).getByText("not computed")).toBeVisible();
  expect(within(open!).getByText("no limit entered")).toBeVisible();
});

it("draws the share of a limit against a post at 100 %, and stops at 125 %", () => {
  const widthOf = (share: number) =>
    Number(
      render(<ShareBar share={share} verdict="within" />)
        .container.querySelector("rect")
        ?.getAttribute("width"),
    );
  expect(widthOf(1)).toBeCloseTo(113.6, 1);
  expect(widthOf(2)).toBe(widthOf(1.25));
  expect(widthOf(-1)).toBe(0);
});

it("draws no curve where nothing was computed", () => {
  const { container } = render(<EbbThumb ebb={null} />);
  expect(container.querySelector(".stroke-tide")).toBeNull();
  const drawn = render(<EbbThumb ebb={{ x: [0, 0.5, NaN, 1], y: [1, 0.5, 0.2, 0.1], postX: 0.4, beyond: false }} />).container;
  expect(drawn.querySelector(".stroke-tide")?.getAttribute("d")).toMatch(/^M[\d. L]+$/);
});
