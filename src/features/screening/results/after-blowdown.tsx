"use client";

import type { ReactNode } from "react";
import { useShown } from "@/components/quantity/quantity";
import { Cell, Row, Table } from "@/components/table/table";
import type { CaseRunView } from "@/contracts/views";
import type { Afterwards } from "@/engine/cases/blowdown-result";
import { CautionBeside } from "./caution-beside";

/** The section closed in after the run: how long until the steel may be pressurised again, and what pressure builds up meanwhile. */
export function AfterBlowdown({ run: { result } }: { run: CaseRunView }) {
  const shown = useShown();
  const { afterwards } = result;
  if (!afterwards) return null;
  const { surroundings, closedIn, rewarm, assumed } = afterwards;
  const temperature = (kelvin: number) => shown("temperature", kelvin).text;
  return (
    <section>
      <h2 className="mb-1">After the blowdown</h2>
      <Table caption="After the blowdown, closed in" stack={false} settled>
        <tbody>
          <Fact term="Surroundings">
            {temperature(surroundings.temperatureK)}, {shown("filmCoefficient", surroundings.coefficientWPerM2K).text}
          </Fact>
          {rewarm && (
            <>
              <Fact term="Coldest steel when the run stops">{temperature(rewarm.coldestAtStopK)}</Fact>
              <Fact term="Coldest steel afterwards">{temperature(rewarm.coldestAfterwardsK)}</Fact>
              <Fact term={`Steel back above ${temperature(rewarm.ratedTemperatureK)}`}>
                <Rewarm rewarm={rewarm} />
              </Fact>
            </>
          )}
          <Fact term={`Pressure once all is at ${temperature(closedIn.temperatureK)}`}>
            {shown("pressure", closedIn.pressurePa).text}
            <small className="block text-label font-normal text-ink-3">
              {shown("pressure", closedIn.lowPa).text} to {shown("pressure", closedIn.highPa).text} within{" "}
              {shown("temperatureDifference", closedIn.bandK).text}
            </small>
          </Fact>
        </tbody>
      </Table>
      {closedIn.aboveDesign && (
        <p className="pt-1.5 font-semibold text-beyond">
          The upper end of that pressure is above the design pressure, line 4.11.
        </p>
      )}
      {assumed.map((sentence) => (
        <p key={sentence} className="pt-1.5 text-small text-ink-3">
          {sentence}
        </p>
      ))}
      <CautionBeside id="M-restart" result={result} />
    </section>
  );
}

function Rewarm({ rewarm }: { rewarm: NonNullable<Afterwards["rewarm"]> }) {
  const shown = useShown();
  if (rewarm.state === "already-above") return <>never below it</>;
  if (rewarm.state === "never" || rewarm.timeS === undefined) return <>not in these surroundings</>;
  const unit = { unit: { SI: "h", US: "h" } } as const;
  return (
    <>
      after {shown("time", rewarm.timeS, unit).text}
      {rewarm.lowS !== undefined && rewarm.highS !== undefined && (
        <small className="block text-label font-normal text-ink-3">
          {shown("time", rewarm.lowS, unit).text} to {shown("time", rewarm.highS, unit).text}
        </small>
      )}
    </>
  );
}

function Fact({ term, children }: { term: string; children: ReactNode }) {
  return (
    <Row>
      <Cell head>{term}</Cell>
      <Cell numeric strong>
        {children}
      </Cell>
    </Row>
  );
}
