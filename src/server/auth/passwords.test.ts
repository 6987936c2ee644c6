import { truncates } from "bcryptjs";
import { describe, expect, it } from "vitest";
import { Refusal } from "@/server/refusal";
import { bcryptInput, checkNewPassword } from "./passwords";

const pepper = "p".repeat(32);

describe("bcryptInput", () => {
  it("fits into what bcrypt reads, however long the password, and has no zero byte", () => {
    const input = bcryptInput("€".repeat(128), pepper);
    expect(input).toHaveLength(64);
    expect(truncates(input)).toBe(false);
    expect(input).not.toContain("\0");
  });

  it("tells passwords apart that bcrypt alone would take for one", () => {
    const long = "a".repeat(72);
    expect(bcryptInput(`${long}X`, pepper)).not.toBe(bcryptInput(`${long}Y`, pepper));
  });

  it("takes one password typed on two keyboards as one, and depends on the pepper", () => {
    expect(bcryptInput("Ångström ﬁeld", pepper)).toBe(bcryptInput("A\u030angstro\u0308m field", pepper));
    expect(bcryptInput("same", pepper)).not.toBe(bcryptInput("same", "q".repeat(32)));
  });
});

describe("checkNewPassword", () => {
  const who = { badge: "E-114", printedName: "Ines Marlow" };
  const refusal = (password: string): string => {
    try {
      checkNewPassword(password, who, "next");
      return "taken";
    } catch (error) {
      return error instanceof Refusal ? (error.parts.problems?.[0]?.message ?? "") : "fault";
    }
  };

  it.each([
    "three unrelated little words",
    "ÄÖÜ äöü ß 15 Zeichen",
    "🌊🌊 ebb and flow at the quay",
    "a".repeat(10) + " bcdefg hij",
  ])("takes %j", (password) => expect(refusal(password)).toBe("taken"));
  it.each([
    ["fourteen chars", /has 14 characters/],
    ["x".repeat(129), /has 129 characters/],
    ["abababababababababab", /repeats a few characters/],
    ["InesMarlow-E-114-2026", /badge, your name/],
    ["Ebbmark Password 12345", /badge, your name/],
  ])("refuses %j and says why", (password, why) => expect(refusal(password)).toMatch(why));
});
