import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, it, vi } from "vitest";
import { Quantity } from "../quantity/quantity";
import { UnitSwitch } from "./unit-switch";
import { SitePressure, UnitsProvider } from "./units-provider";

it("changes what is shown everywhere at once, and keeps the choice", async () => {
  const told = vi.fn();
  render(
    <UnitsProvider initial="SI">
      <UnitSwitch onChange={told} />
      <Quantity quantity="temperature" si={273.15 - 29} />
      <SitePressure barometricPressurePa={80000}>
        <Quantity quantity="pressure" si={880000} />
      </SitePressure>
    </UnitsProvider>,
  );
  expect(screen.getByText("\u221229.0 °C")).toBeVisible();
  expect(screen.getByText("8.00 bar(g)")).toBeVisible();

  await userEvent.click(screen.getByRole("button", { name: "US" }));
  expect(screen.getByRole("button", { name: "US" })).toHaveAttribute("aria-pressed", "true");
  expect(screen.getByText("\u221220.2 °F")).toBeVisible();
  expect(screen.getByText("116 psig")).toBeVisible();
  expect(document.cookie).toContain("units=US");
  expect(told).toHaveBeenCalledExactlyOnceWith("US");
});
