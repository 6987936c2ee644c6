import canonicalize from "canonicalize";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { CanonicalError, canonicalJson, type Json } from "./canonical-json";
import { sha256Hex } from "./sha256";

describe("canonicalJson", () => {
  // RFC 8785, section 3.2.2 to 3.2.4: the example object and its canonical form.
  it("writes the example of RFC 8785", () => {
    const value = {
      numbers: [333333333.33333329, 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
      string: '\u20ac$\nA\'B"\\\\"/',
      literals: [null, true, false],
    };
    expect(canonicalJson(value)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  // As the example of RFC 8785 section 3.2.3, with U+FB02 for its U+FB33, which is not in normal form C and so refused here.
  it("orders keys by UTF-16 units, not by code points", () => {
    const text = canonicalJson({ "\ufb02": 5, "\u20ac": 3, "\u{1f600}": 4, "\u00f6": 2, "1": 1 });
    expect(text).toBe('{"1":1,"\u00f6":2,"\u20ac":3,"\u{1f600}":4,"\ufb02":5}');
  });

  it.each([
    [1e21, "1e+21"],
    [1e23, "1e+23"],
    [1e-7, "1e-7"],
    [-0, "0"],
    [5e-324, "5e-324"],
    [1.7976931348623157e308, "1.7976931348623157e+308"],
    [9007199254740991, "9007199254740991"],
    [295147905179352830000, undefined],
  ])("writes %d as RFC 8785 appendix B does, or refuses an integer that is not exact", (number, text) => {
    if (text === undefined) expect(() => canonicalJson(number)).toThrow("is an integer beyond ±(2^53−1)");
    else expect(canonicalJson(number)).toBe(text);
  });

  it("agrees with a second implementation on whatever both accept", () => {
    fc.assert(
      fc.property(fc.jsonValue({ stringUnit: "grapheme" }), (value) => {
        let ours: string;
        try {
          ours = canonicalJson(value as Json);
        } catch (error) {
          expect(error).toBeInstanceOf(CanonicalError);
          return;
        }
        expect(ours).toBe(canonicalize(value));
        expect(canonicalJson(JSON.parse(ours) as Json)).toBe(ours);
      }),
      { numRuns: 3000, seed: 8785 },
    );
  });

  const circular: unknown[] = [];
  circular.push(circular);
  const deep = (levels: number): Json => (levels === 0 ? 1 : [deep(levels - 1)]);

  it.each<[string, unknown, string]>([
    ["NaN", { a: { b: Number.NaN } }, "a.b is not a finite number"],
    ["Infinity", [Number.POSITIVE_INFINITY], "[0] is not a finite number"],
    ["undefined", { a: undefined }, "a is undefined, which JSON can't say"],
    ["a hole in a list", [1, , 2], "[1] is undefined, which JSON can't say"],
    ["a function", { a: () => 1 }, "a is function, which JSON can't say"],
    ["a bigint", { a: 1n }, "a is bigint, which JSON can't say"],
    ["a date", { a: new Date(0) }, "a is not a plain object"],
    ["a map", { a: new Map() }, "a is not a plain object"],
    ["half a surrogate pair", { a: "\ud83d" }, "a holds half a surrogate pair"],
    ["a control character", { a: "\u0007" }, "a holds a control character"],
    ["a mark that turns the reading direction", { a: "\u202eabc" }, "a holds a mark that turns the reading direction"],
    ["a text in normal form D", { a: "e\u0301" }, "a is not in Unicode normal form C"],
    ["a key in normal form D", { "e\u0301": 1 }, "is not in Unicode normal form C"],
    ["32 levels around a value", deep(32), "is nested more than 32 deep"],
    ["a circle", circular, "is nested more than 32 deep"],
    ["more than a mebibyte", "ü".repeat(600_000), "is larger than 1 MiB"],
  ])("refuses %s", (_what, value, message) => {
    expect(() => canonicalJson(value as Json)).toThrow(message);
  });

  it("gives one text and so one hash whatever the order of keys", () => {
    const hashes = [
      { a: 1, b: [2, { d: 4, c: 3 }] },
      { b: [2, { c: 3, d: 4 }], a: 1 },
    ].map((value) => sha256Hex(canonicalJson(value)));
    expect(hashes[0]).toBe(hashes[1]);
  });
});

describe("sha256Hex", () => {
  // FIPS 180-4 examples: the one-block message "abc", and the empty message.
  it("agrees with the published digests", () => {
    expect(sha256Hex("abc")).toBe("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
    expect(sha256Hex("a", "bc")).toBe("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
    expect(sha256Hex("")).toBe("e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855");
  });
});
