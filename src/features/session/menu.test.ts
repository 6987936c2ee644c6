import { describe, expect, it } from "vitest";
import { menuFor } from "./menu";

const words = (role: Parameters<typeof menuFor>[0]) => menuFor(role, "/desk").map(({ label }) => label);

describe("the menu", () => {
  it("offers each role what it may open", () => {
    expect(words("engineer")).toEqual(["Desk", "Screenings", "Sections", "Change of state", "Log"]);
    expect(words("approver")).toEqual(["Desk", "Screenings", "Sections", "Change of state", "Log"]);
    expect(words("auditor")).toEqual(["Desk", "Change of state", "Log"]);
    expect(words("administrator")).toEqual(["Desk", "People", "Facilities", "Log"]);
  });

  it("marks the item whose pages are being read, and only that", () => {
    const current = (pathname: string) =>
      menuFor("engineer", pathname)
        .filter((item) => item.current)
        .map(({ label }) => label);
    expect(current("/screenings/7f/form/steel")).toEqual(["Screenings"]);
    expect(current("/sections")).toEqual(["Sections"]);
    expect(current("/account")).toEqual([]);
  });
});
