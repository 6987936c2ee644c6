import { render, screen } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { StateWord } from "./state-word";
import { VerdictWord } from "./verdict-word";

describe("VerdictWord", () => {
  it.each([
    ["within", "Within"],
    ["near", "Near"],
    ["beyond", "Beyond"],
    ["open", "Open"],
  ] as const)("shows %s as a sign of its own and the word %s", (verdict, word) => {
    const { container } = render(<VerdictWord verdict={verdict} />);
    expect(screen.getByText(word)).toBeVisible();
    expect(container.querySelector(`svg[data-sign="${verdict}"]`)).toHaveAttribute("aria-hidden", "true");
  });

  it("draws four different signs, so that colour is never the only difference", () => {
    const drawings = (["within", "near", "beyond", "open"] as const).map(
      (verdict) => render(<VerdictWord verdict={verdict} />).container.querySelector("svg")?.innerHTML,
    );
    expect(new Set(drawings).size).toBe(4);
  });
});

it("counts the signatures of a record in the rules of its state", () => {
  const rules = (state: "computed" | "signed" | "countersigned") =>
    render(<StateWord state={state} />)
      .container.querySelector("path")
      ?.getAttribute("d")
      ?.match(/h10/g)?.length;
  expect([rules("computed"), rules("signed"), rules("countersigned")]).toEqual([1, 2, 3]);
});
