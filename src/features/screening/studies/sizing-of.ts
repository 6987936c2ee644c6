import type { PreparedView } from "@/contracts/views";
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import type { SizingCase } from "@/engine/cases/sizing-case";

/**
 * The window asked of a computed screening: its first fire case and its first cold one.
 *
 * Returns   undefined where neither has an orifice
 */
export function sizingOf(
  prepared: PreparedView,
): { sizing: SizingCase; names: { fire: string | undefined; cold: string | undefined } } | undefined {
  const runs = prepared.runs.filter(({ document }) => document.release.path === "orifice" || document.release.path === "sized");
  const fire = runs.find(({ document }) => inFire(document));
  const cold = runs.find(({ document }) => !inFire(document) && document.heat.wall.model !== "none");
  if (!fire && !cold) return undefined;
  const several = prepared.runs.length > 1;
  const name = (letter: string | undefined) => (letter === undefined ? undefined : several ? `case ${letter}` : "this case");
  return {
    sizing: {
      format: "ebbmark-case/1",
      kind: "sizing",
      ...(fire ? { fire: fire.document } : {}),
      ...(cold ? { cold: cold.document } : {}),
    },
    names: { fire: name(fire?.letter), cold: name(cold?.letter) },
  };
}

const inFire = ({ heat }: BlowdownCase): boolean => heat.outside.model === "pool-fire" || heat.outside.model === "surface-fire";
