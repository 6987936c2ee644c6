import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, it } from "vitest";
import { Line } from "./line";
import { LineJump } from "./line-jump";
import { focusLine } from "./next-line";
import { TextField } from "./text-field";
import { UnitField } from "./unit-field";

function Form() {
  return (
    <>
      <Line no="4.01" label="Vessel">
        <TextField value="" />
      </Line>
      <Line no="A5.02" label="Bore">
        <UnitField value="31.5" unit="mm" />
      </Line>
      <LineJump onJump={focusLine} />
    </>
  );
}

// jsdom draws nothing, so there is nothing to scroll to.
Element.prototype.scrollIntoView = () => {};

describe("LineJump", () => {
  it("goes to a line by the number that everything cites", async () => {
    render(<Form />);
    await userEvent.keyboard("/a5.02{Enter}");
    expect(screen.getByLabelText("Bore")).toHaveFocus();
    expect(screen.queryByLabelText("Go to line")).toBeNull();
  });

  it("says when there is no such line, and stays", async () => {
    render(<Form />);
    await userEvent.keyboard("/9.99{Enter}");
    expect(screen.getByRole("alert")).toHaveTextContent("There is no line 9.99");
    expect(screen.getByLabelText("Go to line")).toHaveFocus();
  });

  it("leaves a slash alone that is typed into a field", async () => {
    render(<Form />);
    await userEvent.click(screen.getByLabelText("Vessel"));
    await userEvent.keyboard("/");
    expect(screen.queryByLabelText("Go to line")).toBeNull();
  });
});
