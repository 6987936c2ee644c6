"use client";

import { formatNumber } from "@/components/quantity/format";
import { Power, useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { useUnits } from "@/components/units/units-provider";
import { Cell, Row, Table } from "@/components/table/table";
import type { CaseRunView } from "@/contracts/views";
import { fromSi } from "@/engine/units";

/** start + heat − vented − end = left over, which is what the integration did not account for. */
export function WholeRun({ run }: { run: CaseRunView }) {
  const shown = useShown();
  const { wholeRun } = run.result.energyAccount;
  const { energyClosure, massClosure, ventedMassKg, heatFromOutsideJ, ...summary } = run.result.summary;
  const recounted = summary.energyClosureRecounted;
  const walled = run.document.heat.wall.model !== "none";
  const unit = shownUnit("energy", useUnits().system);
  const energy = (si: number, signed = true) => shown("energy", si, { signed }).text;
  return (
    <section>
      <h2 className="mb-1">Energy over the whole run</h2>
      <Table caption="Energy over the whole run" stack={false}>
        <tbody>
          <Row>
            <Cell head>Internal energy at start</Cell>
            <Cell numeric>{energy(wholeRun.startJ, false)}</Cell>
          </Row>
          <Row>
            <Cell head>{walled ? "Heat from the wall, with what came through it" : "Heat taken from the wall"}</Cell>
            <Cell numeric>{energy(wholeRun.heatFromWallJ)}</Cell>
          </Row>
          {!walled && (
            <Row>
              <Cell head>Heat from outside</Cell>
              <Cell numeric>{energy(wholeRun.heatFromOutsideJ)}</Cell>
            </Row>
          )}
          <Row>
            <Cell head>Less enthalpy of the {shown("mass", ventedMassKg).text} vented</Cell>
            <Cell numeric>{energy(-wholeRun.ventedJ)}</Cell>
          </Row>
          <Row>
            <Cell head>Internal energy at end</Cell>
            <Cell numeric>{energy(wholeRun.endJ, false)}</Cell>
          </Row>
          <Row total>
            <Cell head>Left over</Cell>
            <Cell numeric>
              <Share value={fromSi("energy", wholeRun.leftOverJ, unit)} /> {unit}, <Share value={energyClosure} />
            </Cell>
          </Row>
        </tbody>
      </Table>
      <p className="pt-1.5 text-label text-ink-3">
        {walled && heatFromOutsideJ !== 0 && `${energy(heatFromOutsideJ, false)} went from outside into the wall. `}
        The share is of all energy that moved. Mass closes to <Share value={massClosure} />.{" "}
        {recounted !== undefined && (
          <>
            With outflow and heat counted again from the states along the run, energy closes to <Share value={recounted} /> and
            mass to <Share value={summary.massClosureRecounted ?? 0} />.{" "}
          </>
        )}
        Reference: ideal gas at 25 °C, so dense cold gas stands below zero.
      </p>
    </section>
  );
}

/** What is left over is arithmetic, so its size is told as a power of ten; where it is not small it is told in full. */
function Share({ value }: { value: number }) {
  if (value === 0) return <>0</>;
  return Math.abs(value) < 0.01 ? <Power value={value} figures={1} /> : <>{formatNumber(value, { figures: 3 })}</>;
}
