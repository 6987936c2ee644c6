import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { canonicalJson, type Json } from "./canonical-json";
import { parseCanonicalJson, parseStrictJson } from "./strict-json";

describe("parseStrictJson", () => {
  it.each([
    ['{"a":1,"a":2}', "a stands twice in one object"],
    ['{"a":1,"\\u0061":2}', "a stands twice in one object"],
    ['{"x":[{"k" \n : 1, "l":2, "k":3}]}', "k stands twice in one object"],
    [`{"a"${" ".repeat(200)}:1,"a":2}`, "a stands twice in one object"],
    ['{"a":1', "is not JSON"],
    ["[".repeat(33) + "]".repeat(33), "is nested more than 32 deep"],
  ])("refuses %s", (text, message) => {
    expect(() => parseStrictJson(text)).toThrow(message);
  });

  it.each(['{"a":{"a":{"a":1}}}', '[{"a":1},{"a":1}]', '{"a":"a","b":"\\"a\\":"}', '["a","a"]', '{"a":"{\\"b\\":1,\\"b\\":2}"}'])(
    "takes %s",
    (text) => {
      expect(parseStrictJson(text)).toEqual(JSON.parse(text));
    },
  );

  it("takes whatever JSON.stringify writes", () => {
    fc.assert(
      fc.property(fc.jsonValue({ maxDepth: 6 }), (value) => {
        const text = JSON.stringify(value);
        expect(parseStrictJson(text)).toEqual(JSON.parse(text));
      }),
      { numRuns: 2000, seed: 1 },
    );
  });
});

describe("parseCanonicalJson", () => {
  it.each(['{"b":1,"a":2}', '{"a": 1}', "1.0", "-0", '"\\u0041"', '{"a":1}\n'])("refuses %s", (text) => {
    expect(() => parseCanonicalJson(text)).toThrow("is not in canonical form");
  });

  it("reads back what canonicalJson wrote", () => {
    const value: Json = { z: [1, 0.1, "ü\n"], a: { c: null, b: true } };
    expect(parseCanonicalJson(canonicalJson(value))).toEqual(value);
  });
});
