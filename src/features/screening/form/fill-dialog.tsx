"use client";

import { Button } from "@/components/button/button";
import { Dialog } from "@/components/dialog/dialog";
import { askedKeysOf } from "@/contracts/draft";
import { siOf } from "@/contracts/derive-si";
import type { LineKey, QuantityLine } from "@/contracts/lines/line";
import { useDraft } from "./draft-context";
import { unitTyped } from "./shown-unit";

/** A pasted column fills the lines downwards from where it was pasted: shown first, counted only when taken over. */
export function FillDialog({ from, cells, onClose }: { from: LineKey; cells: string[]; onClose: () => void }) {
  const { draft, letter, setLine, unitOf, chooseUnit, subject } = useDraft();
  const baro = subject.site.barometricPressurePa;
  const all = askedKeysOf(draft, letter);
  const start = all.find(({ key }) => key === from);
  const lines = all.filter(({ line }) => line.kind === "quantity" && line.part === start?.line.part);
  const first = lines.findIndex(({ key }) => key === from);
  const filled = cells.flatMap((typed, at) => {
    const target = lines[first + at];
    if (!target || typed === "") return [];
    const line = target.line as QuantityLine; // filtered by kind above
    const unit = unitOf(target.key, line);
    return [{ key: target.key, line, typed, unit, reads: siOf(line, { typed, unit, si: null }, baro) !== null }];
  });
  const left = cells.length - filled.length;

  const fill = () => {
    for (const { key, line, typed, unit } of filled) {
      const moved = unitTyped(line, { typed, unit, si: null, source: null }, baro);
      setLine(key, moved ?? { typed, unit });
      if (moved) chooseUnit(key, moved.unit);
    }
    onClose();
  };

  return (
    <Dialog
      open
      onClose={onClose}
      title="Fill from the pasted column"
      actions={
        <>
          <Button kind="main" onClick={fill} waitsFor={filled.length === 0 ? "No cell fits a line here." : undefined}>
            {`Fill ${filled.length} ${filled.length === 1 ? "line" : "lines"}`}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </>
      }
    >
      <table className="ruled">
        <caption className="sr-only">Lines to be filled</caption>
        <tbody>
          {filled.map(({ key, line, typed, unit, reads }) => (
            <tr key={key}>
              <td className="line-no">{key}</td>
              <th scope="row">{line.label}</th>
              <td className={`numeric ${reads ? "" : "text-beyond"}`}>
                {typed} {/[a-z°]/i.test(typed) ? "" : unit}
                {!reads && ", not a number here"}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {left > 0 && <p className="pt-2 text-small text-ink-3">{left} pasted cells have no line and are left out.</p>}
    </Dialog>
  );
}
