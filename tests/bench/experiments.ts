/** Prints measured against computed as JSON, for docs/methods/experiments.json. */
import { burstPipe, emptiedVessels, nitrogenCriticalFactor, smallPlenum, waterCriticalFlow } from "../fixtures/experiments";

const rounded = (_key: string, value: unknown): unknown => (typeof value === "number" ? Number(value.toPrecision(6)) : value);
console.log(
  JSON.stringify(
    {
      note: "Measured or published values beside this engine's own. Sources, uncertainties and bands: tests/fixtures/checks/experiments.json.",
      waterCriticalFlow: waterCriticalFlow(),
      emptiedVessels: emptiedVessels(),
      burstPipe: burstPipe(),
      nitrogenCriticalFactor: nitrogenCriticalFactor(),
      smallPlenum: smallPlenum(),
    },
    rounded,
    1,
  ),
);
