import { describe, expect, it } from "vitest";
import { checkEquations, checkFluid, readCheck, relativeError, type CheckComponent } from "../../../tests/fixtures/check-file";
import { runPath } from "./run-path";

interface State {
  v: number;
  Z: number;
  u: number;
  h: number;
  s: number;
  u_dep: number;
  h_dep: number;
  s_dep: number;
}
interface Model {
  dU: number;
  dH: number;
  dS: number;
  ideal_dH: number;
  ideal_dS_T_and_P: number;
  state1: State;
  state2: State;
}
type Row = { id: string; fluid: string; T1: number; P1: number; T2: number; P2: number; kind: string } & Record<
  "PR" | "SRK" | "VDW",
  Model
>;

const file = readCheck<{ components: Record<string, CheckComponent>; rows: Row[] }>("paths.json");

/**
 * Two programs that sum the same terms in another order differ by a few units in the last place of the largest term: the
 * departures of a thin gas and small totals are therefore held to 1e-8 of themselves or 1e-10 of R T (R for entropies).
 */
function expectClose(value: number, expected: number, scale: number, what: string): void {
  expect(Math.abs(value - expected), what).toBeLessThanOrEqual(Math.max(1e-8 * Math.abs(expected), 1e-10 * scale));
}

describe("change of state against tests/fixtures/checks/paths.json (own cubic engine of that file, checked there against thermo 0.6.1)", () => {
  for (const row of file.rows) {
    for (const [column, equation] of Object.entries(checkEquations)) {
      const model = row[column as "PR"];
      it(`${row.id} ${row.fluid} ${row.kind} by ${column}`, () => {
        const result = runPath({
          format: "ebbmark-case/1",
          kind: "path",
          fluid: checkFluid(file.components, [row.fluid], [1], equation),
          from: { temperatureK: row.T1, pressurePa: row.P1 },
          to: { temperatureK: row.T2, pressurePa: row.P2 },
        });
        const RT = 8.3 * row.T1;
        expectClose(result.internalEnergyJPerMol.total, model.dU, RT, "ΔU");
        expectClose(result.enthalpyJPerMol.total, model.dH, RT, "ΔH");
        expectClose(result.entropyJPerMolK.total, model.dS, 8.3, "ΔS");
        expectClose(result.enthalpyJPerMol.idealGas, model.ideal_dH, RT, "ideal-gas ΔH");
        expectClose(result.entropyJPerMolK.idealGas, model.ideal_dS_T_and_P, 8.3, "ideal-gas ΔS");
        expectClose(result.enthalpyJPerMol.departureOut, -model.state1.h_dep, RT, "departure out, H");
        expectClose(result.enthalpyJPerMol.departureBack, model.state2.h_dep, RT, "departure back, H");
        expectClose(result.internalEnergyJPerMol.departureOut, -model.state1.u_dep, RT, "departure out, U");
        expectClose(result.internalEnergyJPerMol.departureBack, model.state2.u_dep, RT, "departure back, U");
        expectClose(result.entropyJPerMolK.departureOut, -model.state1.s_dep, 8.3, "departure out, S");
        expectClose(result.entropyJPerMolK.departureBack, model.state2.s_dep, 8.3, "departure back, S");
        expect(relativeError(result.from.molarVolumeM3PerMol, model.state1.v)).toBeLessThan(1e-8);
        expect(relativeError(result.to.molarVolumeM3PerMol, model.state2.v)).toBeLessThan(1e-8);
        expect(relativeError(result.from.compressibility, model.state1.Z)).toBeLessThan(1e-8);
      });
    }
  }
});
