/** The pieces of steel that are looked at in a fire: the vessel or the vessels of the section, and what the case lists besides. */
import type { BlowdownCase, VesselGeometry, WallSpec } from "../cases/blowdown-case";
import { EngineError } from "../errors";
import { isSteelId, steelById, steelIds } from "../steels/steel";
import type { PressurePart } from "./rupture";

export type Item = PressurePart & { id: string; name: string; part: "dry" | "wet" };

/** `wetted` says whether liquid touches the steel at the start: then each vessel counts twice, above and below the level. */
export function itemsInFire({ vessel, vessels, steelInFire }: BlowdownCase, wetted: boolean): Item[] {
  const shells = vessels
    ? vessels.map(({ name, geometry, wall }, i) => ({ name: name ?? `Vessel ${i + 1}`, geometry, wall, id: `vessel-${i + 1}` }))
    : [{ name: "Vessel", geometry: vessel.geometry, wall: vessel.wall, id: "vessel" }];
  const own = shells.flatMap(({ id, name, geometry, wall }) =>
    wall ? diametersOf(geometry).map((shell, k) => ({ id: k === 0 ? id : `${id}-${k + 1}`, name, wall, ...shell })) : [],
  );
  const listed = (steelInFire?.items ?? []).map((item, i) => ({
    id: `item-${i + 1}`,
    name: item.name,
    part: "dry" as const,
    steel: steelOf(item.steel, `steelInFire.items[${i}].steel`),
    insideDiameterM: item.insideDiameterM,
    thicknessM: item.thicknessM,
    sphere: false,
  }));
  return [
    ...own.flatMap((shell) => (wetted ? [shellItem(shell, "dry"), shellItem(shell, "wet")] : [shellItem(shell, "dry")])),
    ...listed,
  ];
}

type Shell = { id: string; name: string; wall: WallSpec; insideDiameterM: number; sphere: boolean };

function shellItem({ id, name, wall, insideDiameterM, sphere }: Shell, part: Item["part"]): Item {
  return {
    id: `${id}-${part}`,
    name: `${name}, ${part}`,
    part,
    steel: steelOf(wall.steel, "vessel.wall.steel"),
    insideDiameterM,
    thicknessM: wall.thicknessM,
    sphere,
  };
}

/** A plain volume has no diameter, so its stress is not known. */
function diametersOf(geometry: VesselGeometry): { insideDiameterM: number; sphere: boolean }[] {
  if (geometry.shape === "volume") return [];
  if (geometry.shape === "section") return geometry.parts.flatMap(diametersOf);
  return [{ insideDiameterM: geometry.insideDiameterM, sphere: geometry.shape === "sphere" }];
}

function steelOf(id: string, path: string): PressurePart["steel"] {
  if (isSteelId(id)) return steelById(id);
  throw new EngineError("invalid-case", `There is no wall material "${id}". Use one of ${steelIds.join(", ")}.`, {}, path);
}
