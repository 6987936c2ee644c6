"use client";

import { useMemo } from "react";
import { CurveChart } from "@/components/charts/curve-chart";
import { formatNumber } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { VerdictWord } from "@/components/verdict/verdict-word";
import type { CaseRunView } from "@/contracts/views";
import { CautionBeside } from "./caution-beside";
import { steelCurves } from "./steel-curves";
import { useShowing } from "./use-showing";

const fires = { "open-pool": "open pool", "confined-pool": "confined pool", jet: "impinging jet" } as const;

/** Steel that heats up in the flames while the pressure falls: the item that governs as curves, all of them in a table. */
export function SteelFire({ run: { result } }: { run: CaseRunView }) {
  const shown = useShown();
  const showing = useShowing();
  const fire = result.steelInFire;
  const { initialPressurePa } = result.summary;
  const governing = fire?.items.find(({ governs }) => governs) ?? fire?.items[0];
  const curves = useMemo(
    () => (fire && governing ? steelCurves(governing, fire, initialPressurePa, showing) : undefined),
    [fire, governing, initialPressurePa, showing],
  );
  if (!fire || !governing || !curves) return null;
  const minutes = (seconds: number | undefined) =>
    seconds === undefined ? `not in ${shown("time", fire.horizonS).text}` : shown("time", seconds).text;
  return (
    <section className="mt-7">
      <h2 className="mb-1">Steel in the fire</h2>
      <p className="pb-3 font-serif text-prose text-ink-2">
        <VerdictWord verdict={fire.verdict} /> {fire.sentence}
      </p>
      <div className="grid grid-cols-2 items-start gap-9 rail:grid-cols-1 rail:gap-6">
        <div>
          <CurveChart
            {...curves.strength}
            height="tall"
            summary={fire.sentence}
            caption={
              <>
                <b>Strength against stress, {governing.name}.</b> Two curves that must not meet.
              </>
            }
          />
          <CurveChart
            {...curves.temperature}
            height="low"
            summary={`The steel reaches ${shown("temperature", governing.hottestWallK).text}.`}
          />
        </div>
        <div>
          <Table caption="Steel in the fire, item by item" settled>
            <thead>
              <tr>
                <HeadCell>Item</HeadCell>
                <HeadCell numeric>Wall</HeadCell>
                <HeadCell numeric>Rupture without</HeadCell>
                <HeadCell numeric>Least ratio</HeadCell>
                <HeadCell>Verdict</HeadCell>
              </tr>
            </thead>
            <tbody>
              {fire.items.map((item) => (
                <Row key={item.id}>
                  <Cell head>{item.name}</Cell>
                  <Cell numeric label="Wall">
                    {shown("length", item.thicknessM).text}
                  </Cell>
                  <Cell numeric label="Rupture without blowdown">
                    {minutes(item.ruptureTimeShutInS)}
                  </Cell>
                  <Cell numeric strong label="Least ratio">
                    {formatNumber(item.leastRatio, { figures: 2 })} at {shown("time", item.leastRatioTimeS).text}
                  </Cell>
                  <Cell>
                    <VerdictWord verdict={item.verdict} />
                  </Cell>
                </Row>
              ))}
            </tbody>
          </Table>
          <p className="pt-2 font-serif text-note text-ink-2">
            Least ratio of hot strength, {formatNumber(100 * fire.strengthFraction, { decimals: 0 })} % of it counted, to hoop
            stress; rupture is where it comes to one. Fire: {fires[fire.fire.basis]},{" "}
            {shown("heatFlux", fire.fire.initialFluxWPerM2).text} into steel at start. Without blowdown the pressure is held at{" "}
            {shown("pressure", fire.shutInPressurePa).text}. With 30 % more flux, the blowdown running, rupture:{" "}
            {minutes(governing.ruptureTimeAtMoreFluxS)}. Longitudinal stress, supports and flanges are not screened here.
          </p>
          <CautionBeside id="C4" result={result} />
          <CautionBeside id="M-rupture" result={result} />
        </div>
      </div>
    </section>
  );
}
