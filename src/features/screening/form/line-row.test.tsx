import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { Formik, useFormikContext } from "formik";
import { useEffect, useMemo, useState, type ReactNode } from "react";
import { describe, expect, it } from "vitest";
import { UnitsProvider, useUnits } from "@/components/units/units-provider";
import { siOf } from "@/contracts/derive-si";
import { newDraft, type DraftDocument } from "@/contracts/draft";
import { caseFromDraft } from "@/contracts/draft-to-case";
import { parseLineKey } from "@/contracts/lines/registry";
import { defaultPolicy } from "@/contracts/policy";
import { DraftContext, type DraftInHand } from "./draft-context";
import { lineErrors } from "./line-schema";
import { LineRow } from "./line-row";
import { shownUnitOf } from "./shown-unit";

const site = { barometricPressurePa: 95_000, policy: defaultPolicy };
let draft: DraftDocument = newDraft("t");

/** The draft alone, without keeping: lines read and change it as on the page. */
function Held({ children, editable }: { children: ReactNode; editable: boolean }) {
  const { values, setValues } = useFormikContext<DraftDocument>();
  const { system, setSystem } = useUnits();
  const [units, setUnits] = useState<Record<string, string>>({});
  useEffect(() => {
    draft = values;
  }, [values]);
  const held = useMemo(() => {
    const unitOf: DraftInHand["unitOf"] = (key, line) => shownUnitOf(line, values.lines[key], system, units[key]);
    return {
      subject: { site },
      draft: values,
      editable,
      errors: lineErrors(values, site, unitOf),
      made: caseFromDraft(values, "A", site),
      unitOf,
      chooseUnit: (key, unit) => setUnits((before) => ({ ...before, [key]: unit })),
      setLine: (key, change) =>
        void setValues((before) => {
          const value = { typed: "", unit: null, si: null, source: null, ...before.lines[key], ...change };
          const line = parseLineKey(key)?.line;
          return { ...before, lines: { ...before.lines, [key]: line ? { ...value, si: siOf(line, value, 95_000) } : value } };
        }, false),
    } as DraftInHand; // the lines use no more than this
  }, [values, setValues, system, units, editable]);
  return (
    <DraftContext.Provider value={held}>
      {children}
      <button
        onClick={() => {
          setUnits({});
          setSystem(system === "SI" ? "US" : "SI");
        }}
      >
        switch units
      </button>
    </DraftContext.Provider>
  );
}

function show(keys: string[], editable = true) {
  render(
    <UnitsProvider initial="SI">
      <Formik<DraftDocument> initialValues={newDraft("t")} onSubmit={() => undefined}>
        <Held editable={editable}>
          {keys.map((key) => {
            const line = parseLineKey(key)?.line;
            return line && <LineRow key={key} line={line} lineKey={key} />;
          })}
        </Held>
      </Formik>
    </UnitsProvider>,
  );
  return userEvent.setup();
}

const field = (name: RegExp) => screen.getByRole("textbox", { name });

describe("a quantity line", () => {
  it("takes a unit typed behind the figure and keeps both beside the SI value", async () => {
    const user = show(["4.03"]);
    await user.type(field(/^Wall thickness/), "1.24 in");
    expect(draft.lines["4.03"]?.si).toBeCloseTo(0.031496, 9);
    await user.tab();
    expect(field(/^Wall thickness/)).toHaveValue("1.24");
    expect(screen.getByRole("combobox", { name: "Unit of Wall thickness" })).toHaveValue("in");
    expect(draft.lines["4.03"]).toMatchObject({ typed: "1.24", unit: "in" });
  });

  it("reads gauge pressures against the site's barometer", async () => {
    const user = show(["2.09"]);
    await user.type(field(/^Pressure at start/), "25 barg");
    expect(draft.lines["2.09"]?.si).toBeCloseTo(25e5 + 95_000, 3);
  });

  it("changes what is shown and never what is stored when units are switched", async () => {
    const user = show(["4.03"]);
    await user.type(field(/^Wall thickness/), "25.4");
    const before = draft.lines["4.03"];
    await user.click(screen.getByRole("button", { name: "switch units" }));
    expect(screen.getByRole("combobox", { name: "Unit of Wall thickness" })).toHaveValue("in");
    expect(Number((field(/^Wall thickness/) as HTMLInputElement).value)).toBe(1);
    await user.selectOptions(screen.getByRole("combobox", { name: "Unit of Wall thickness" }), "cm");
    expect(Number((field(/^Wall thickness/) as HTMLInputElement).value)).toBe(2.54);
    expect(draft.lines["4.03"]).toEqual(before);
  });

  it("says what is wrong with the range in the unit in use, and keeps the text", async () => {
    const user = show(["4.03"]);
    await user.type(field(/^Wall thickness/), "9000");
    expect(field(/^Wall thickness/)).toBeInvalid();
    expect(field(/^Wall thickness/)).toHaveAccessibleDescription(/too high.*500.*mm/);
    expect(draft.lines["4.03"]?.typed).toBe("9000");
  });

  it("asks for the source once there is a value, and takes it", async () => {
    const user = show(["4.03"]);
    expect(screen.queryByRole("button", { name: "Source of Wall thickness" })).toBeNull();
    await user.type(field(/^Wall thickness/), "25.4");
    await user.click(screen.getByRole("button", { name: "Source of Wall thickness" }));
    await user.selectOptions(screen.getByRole("combobox", { name: "Kind of source" }), "assumed");
    await user.type(screen.getByRole("textbox", { name: "Reason for the assumption" }), "no sheet{Enter}");
    expect(draft.lines["4.03"]?.source).toEqual({ kind: "assumed", note: "no sheet" });
    expect(screen.getByRole("button", { name: "Source of Wall thickness" })).toHaveTextContent("Assumed no sheet");
  });

  it("goes to the next line's value with Enter", async () => {
    const user = show(["2.09", "2.10"]);
    await user.type(field(/^Pressure at start/), "70{Enter}");
    expect(field(/^Temperature at start/)).toHaveFocus();
  });

  it("can't be typed in where the viewer only reads", async () => {
    const user = show(["4.03"], false);
    await user.type(field(/^Wall thickness/), "25.4");
    expect(draft.lines["4.03"]).toBeUndefined();
  });
});

describe("a limit", () => {
  it("is the policy's until it is set here, and goes back to it", async () => {
    const user = show(["A7.01"]);
    expect(field(/^Time to target pressure/)).toHaveAttribute("readonly");
    expect(Number((field(/^Time to target pressure/) as HTMLInputElement).value)).toBe(15);
    await user.click(screen.getByRole("button", { name: "Set here" }));
    await user.type(field(/^Time to target pressure/), "10");
    expect(draft.lines["A7.01"]?.si).toBe(600);
    expect(screen.getByText(/^15(\.0)? min$/).tagName).toBe("S");
    await user.click(screen.getByRole("button", { name: "Take the policy value" }));
    expect(draft.lines["A7.01"]?.si).toBeNull();
    expect(field(/^Time to target pressure/)).toHaveAttribute("readonly");
  });
});

describe("a choice that decides which lines follow", () => {
  it("is one group of radios", async () => {
    const user = show(["2.02-1"]);
    const group = screen.getByRole("radiogroup", { name: "Shape" });
    await user.click(within(group).getByRole("radio", { name: /^Sphere/ }));
    expect(draft.lines["2.02-1"]?.typed).toBe("sphere");
    expect(within(group).getAllByRole("radio", { checked: true })).toHaveLength(1);
  });
});
