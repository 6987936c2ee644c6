import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, it, vi } from "vitest";
import { Line } from "./line";
import { UnitField } from "./unit-field";

function WallThickness({ message }: { message?: string }) {
  const [typed, setTyped] = useState("");
  const [unit, setUnit] = useState("mm");
  return (
    <Line
      no="4.03"
      label="Wall thickness"
      hint="nominal less corrosion allowance"
      message={message ? { tone: "bad", text: message } : undefined}
    >
      <UnitField value={typed} unit={unit} units={["mm", "in"]} onValueChange={setTyped} onUnitChange={setUnit} />
    </Line>
  );
}

describe("UnitField in a line", () => {
  it("keeps what is typed, unit and all, under the line's label", async () => {
    render(<WallThickness />);
    const value = screen.getByLabelText("Wall thickness");
    await userEvent.type(value, "1 in");
    expect(value).toHaveValue("1 in");
    expect(value).toHaveAccessibleDescription("nominal less corrosion allowance");
  });

  it("offers the units in a menu named after the line", async () => {
    render(<WallThickness />);
    const menu = screen.getByRole("combobox", { name: "Unit of Wall thickness" });
    await userEvent.selectOptions(menu, "in");
    expect(menu).toHaveValue("in");
  });

  it("reads the error with the field", () => {
    render(<WallThickness message="Type a number." />);
    const value = screen.getByLabelText("Wall thickness");
    expect(value).toHaveAttribute("aria-invalid", "true");
    expect(value).toHaveAccessibleDescription("Type a number. nominal less corrosion allowance");
  });

  it("goes to the next line's value on Enter, after leaving the first", async () => {
    const leave = vi.fn();
    render(
      <>
        <Line no="4.03" label="Wall thickness">
          <UnitField value="" unit="mm" units={["mm", "in"]} onUnitChange={() => {}} onLeave={leave} />
        </Line>
        <Line no="4.04" label="Wall at start">
          <UnitField value="8.5" unit="°C" />
        </Line>
      </>,
    );
    await userEvent.click(screen.getByLabelText("Wall thickness"));
    await userEvent.keyboard("{Enter}");
    expect(screen.getByLabelText("Wall at start")).toHaveFocus();
    expect(leave).toHaveBeenCalledOnce();
  });

  it("can't be typed into once derived, and shows its unit as text", async () => {
    const change = vi.fn();
    render(
      <Line no="4.04" label="Inside surface" tone="derived">
        <UnitField value="71.0" unit="m²" onValueChange={change} />
      </Line>,
    );
    await userEvent.type(screen.getByLabelText("Inside surface"), "9");
    expect(change).not.toHaveBeenCalled();
    expect(screen.queryByRole("combobox")).toBeNull();
    expect(screen.getByText("m²")).toBeVisible();
  });
});
