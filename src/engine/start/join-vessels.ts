/**
 * Several vessels and pipe runs as one vessel: volumes, areas and levels add; the walls become one lump.
 *
 *   mass       the sum                                   steel        that of most mass
 *   thickness, specific heat given, insulation           means, weighted by mass
 *   rated temperature   the highest, where every wall has one      design pressure   the lowest given
 *
 * Throws   EngineError "invalid-case" with the path, where some parts have what others lack
 */
import { makeWall } from "../cases/blowdown/wall";
import type { BlowdownCase, SectionPart, WallSpec } from "../cases/blowdown-case";
import { EngineError } from "../errors";
import { measureVessel } from "../vessel/geometry";

export function joinVessels(parts: readonly SectionPart[]): BlowdownCase["vessel"] {
  const wall = joinWalls(parts);
  return { geometry: { shape: "section", parts: parts.map((part) => part.geometry) }, ...(wall ? { wall } : {}) };
}

type WeighedWall = WallSpec & { massKg: number };

function joinWalls(parts: readonly SectionPart[]): WallSpec | undefined {
  if (!allOrNone(parts, (part) => part.wall, "wall", "Give every part its wall, or none.")) return undefined;
  const walls = parts.map(({ geometry, wall }, i) => weighed(wall as WallSpec, measureVessel(geometry), i));
  const massKg = walls.reduce((sum, wall) => sum + wall.massKg, 0);
  const mean = (pick: (wall: WeighedWall) => number): number =>
    walls.reduce((sum, wall) => sum + (pick(wall) * wall.massKg) / massKg, 0);
  const heaviest = walls.reduce((most, wall) => (massOf(walls, wall.steel) > massOf(walls, most.steel) ? wall : most));
  const ratings = walls.flatMap((wall) => wall.minimumDesignMetalTemperatureK ?? []);
  const designs = walls.flatMap((wall) => wall.designPressurePa ?? []);
  const heats = allOrNone(
    parts,
    ({ wall }) => wall?.specificHeatJPerKgK,
    "wall.specificHeatJPerKgK",
    "Give every wall its specific heat, or none.",
  );
  const insulated = allOrNone(
    parts,
    ({ wall }) => wall?.insulation,
    "wall.insulation",
    "Give every wall its insulation, or none.",
  );
  const thicknessOfInsulation = mean((wall) => wall.insulation?.thicknessM ?? 0);
  const conductance = mean(({ insulation }) => (insulation ? insulation.conductivityWPerMK / insulation.thicknessM : 0));
  return {
    steel: heaviest.steel,
    thicknessM: mean((wall) => wall.thicknessM),
    massKg,
    ...(heats ? { specificHeatJPerKgK: mean((wall) => wall.specificHeatJPerKgK ?? 0) } : {}),
    ...(designs.length > 0 ? { designPressurePa: Math.min(...designs) } : {}),
    ...(ratings.length === walls.length ? { minimumDesignMetalTemperatureK: Math.max(...ratings) } : {}),
    ...(insulated
      ? { insulation: { thicknessM: thicknessOfInsulation, conductivityWPerMK: conductance * thicknessOfInsulation } }
      : {}),
  };
}

function weighed(wall: WallSpec, vessel: ReturnType<typeof measureVessel>, i: number): WeighedWall {
  try {
    return { ...wall, massKg: makeWall("lumped", wall, vessel, 293.15).massKg };
  } catch (error) {
    if (error instanceof EngineError) throw error.at((error.path ?? "vessel.wall").replace("vessel.", `vessels[${i}].`));
    throw error;
  }
}

const massOf = (walls: readonly WeighedWall[], steel: string): number =>
  walls.reduce((sum, wall) => sum + (wall.steel === steel ? wall.massKg : 0), 0);

function allOrNone(parts: readonly SectionPart[], pick: (part: SectionPart) => unknown, path: string, message: string): boolean {
  const having = parts.filter((part) => pick(part) !== undefined).length;
  if (having === 0) return false;
  if (having === parts.length) return true;
  const missing = parts.findIndex((part) => pick(part) === undefined);
  throw new EngineError(
    "invalid-case",
    `This is missing, and other vessels have it. ${message}`,
    {},
    `vessels[${missing}].${path}`,
  );
}
