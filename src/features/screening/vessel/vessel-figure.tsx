"use client";

import type { ReactNode } from "react";
import { useShown } from "@/components/quantity/quantity";
import { VesselDrawing } from "@/components/vessel/vessel-drawing";
import type { OutletPlace, VesselGeometry } from "@/engine/cases/blowdown-case";
import { measureVessel } from "@/engine/vessel/geometry";

/**
 * A vessel to scale with the figures that follow from it: what it holds, what gas and liquid wet.
 *
 * levelM        of the liquid; undefined where there is none or nobody knows
 * steelMassKg   of the shell, where a wall is in the balance
 */
export function VesselFigure({
  tag,
  geometry,
  levelM,
  outlet,
  steelMassKg,
}: {
  tag: string;
  geometry: VesselGeometry;
  levelM?: number | undefined;
  outlet?: OutletPlace | undefined;
  steelMassKg?: number | undefined;
}) {
  const shown = useShown();
  const { volumeM3, innerAreaM2, below } = measureVessel(geometry);
  const liquid = below && levelM !== undefined ? below(levelM) : undefined;
  const area = (m2: number | undefined) => (m2 === undefined ? "–" : shown("area", m2).text);
  return (
    <figure className="unbroken min-w-0 pb-3 pt-1">
      <VesselDrawing items={[{ tag, geometry, levelM }]} {...(outlet ? { outlet } : {})} />
      <figcaption>
        <dl className="mt-2 flex flex-wrap gap-x-7 gap-y-1.5 border-t pt-2 text-small">
          <Fact term="Holds">{shown("volume", volumeM3).text}</Fact>
          {liquid && levelM !== undefined && levelM > 0 && (
            <Fact term="Liquid">
              {shown("volume", liquid.volumeM3).text}, level {shown("length", levelM, { unit: { SI: "m", US: "ft" } }).text}
            </Fact>
          )}
          {innerAreaM2 !== undefined && (
            <>
              <Fact term={<Key dashed={false}>Gas-wetted wall</Key>}>{area(innerAreaM2 - (liquid?.areaM2 ?? 0))}</Fact>
              {liquid && liquid.areaM2 > 0 && <Fact term={<Key dashed>Liquid-wetted wall</Key>}>{area(liquid.areaM2)}</Fact>}
            </>
          )}
          {steelMassKg !== undefined && <Fact term="Steel">{shown("mass", steelMassKg).text}</Fact>}
        </dl>
      </figcaption>
    </figure>
  );
}

function Fact({ term, children }: { term: ReactNode; children: ReactNode }) {
  return (
    <div className="flex items-baseline gap-2">
      <dt className="text-ink-3">{term}</dt>
      <dd className="font-semibold">{children}</dd>
    </div>
  );
}

/** The stroke that a zone is drawn with, before its name. */
function Key({ dashed, children }: { dashed: boolean; children: ReactNode }) {
  return (
    <>
      <svg width="28" height="8" viewBox="0 0 28 8" aria-hidden="true" className="mr-1.5">
        <path
          d="M0 4h28"
          className="stroke-c-wall"
          strokeWidth={dashed ? 6 : 3.2}
          {...(dashed ? { strokeDasharray: "9 3" } : {})}
        />
      </svg>
      {children}
    </>
  );
}
