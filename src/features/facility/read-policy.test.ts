import { describe, expect, it } from "vitest";
import { emptyFacility, readFacility } from "./read-policy";

const form = (fields: Partial<typeof emptyFacility>) => ({ ...emptyFacility, code: "vr", name: "Varn Reach", ...fields });

describe("a facility as typed", () => {
  it("becomes SI, with the default near band and no limit where none is typed", () => {
    const read = readFacility(form({}));
    if (!("facility" in read)) throw new Error(JSON.stringify(read.problems));
    expect(read.facility).toMatchObject({
      code: "VR",
      barometricPressurePa: 101325,
      policy: { targetTimeS: 900, minimumMetalMarginK: 0, nearBandK: 10 },
    });
    expect(read.facility.policy.targetPressurePaGauge).toBeCloseTo(690000, 6);
    expect(read.facility.policy).not.toHaveProperty("ventCapacityKgPerS");
  });

  it("takes other units", () => {
    const read = readFacility(
      form({
        barometricPressure: "12.5 psia",
        targetPressure: "100 psig",
        targetTime: "600 s",
        outletTemperature: "-100",
        ventCapacity: "36 t/h",
      }),
    );
    if (!("facility" in read)) throw new Error(JSON.stringify(read.problems));
    expect(read.facility.policy.targetPressurePaGauge).toBeCloseTo(689475.729, 2);
    expect(read.facility.policy).toMatchObject({
      targetTimeS: 600,
      minimumOutletTemperatureK: expect.closeTo(173.15, 6),
      ventCapacityKgPerS: expect.closeTo(10, 6),
    });
  });

  it.each([
    [{ code: "V" }, "code"],
    [{ name: " " }, "name"],
    [{ barometricPressure: "2" }, "barometricPressure"],
    [{ barometricPressure: "high" }, "barometricPressure"],
    [{ targetPressure: "-1" }, "targetPressure"],
    [{ targetTime: "" }, "targetTime"],
    [{ metalMargin: "-5" }, "metalMargin"],
  ] as const)("with %o says what is wrong with it, and with nothing else", (fields, at) => {
    const read = readFacility(form(fields));
    expect("problems" in read && Object.keys(read.problems)).toEqual([at]);
  });
});
