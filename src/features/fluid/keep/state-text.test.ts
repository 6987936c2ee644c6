import { describe, expect, it } from "vitest";
import { stateFromText, stateToText } from "./state-text";

const state = (pressure: string, temperature: string) => ({
  pressure: { text: pressure, unit: "bar(g)" },
  temperature: { text: temperature, unit: "°C" },
});

describe("a typed state in an address", () => {
  it.each([state("70", "35"), state("", ""), state("1 450.", "−20"), state("70,5", "cold")])(
    "comes back as it was typed: %o",
    (one) => {
      expect(stateFromText(stateToText(one))).toEqual(one);
    },
  );

  it.each(["", "70 bar(g)", "70 bar(g);35 °C;x", "70 bananas;35 °C", "70;35"])("is nothing where %o stands", (text) => {
    expect(stateFromText(text)).toBeNull();
  });
});
