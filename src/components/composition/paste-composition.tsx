"use client";

import { useId, useState } from "react";
import { Button } from "@/components/button/button";
import { Dialog } from "@/components/dialog/dialog";
import { Labelled } from "@/components/line/labelled";
import { TextArea } from "@/components/line/text-area";
import type { CompositionRow } from "@/contracts/draft";
import { pastedComposition } from "./pasted-composition";

/** A pasted table is read, shown with its matches, and counts only when it is taken over. */
export function PasteComposition({
  open,
  onClose,
  onUse,
}: {
  open: boolean;
  onClose: () => void;
  onUse: (rows: CompositionRow[]) => void;
}) {
  const [text, setText] = useState("");
  const id = useId();
  const read = pastedComposition(text);
  const usable = read.flatMap(({ component, typed }) => (component ? [{ id: component.id, typed, molePercent: null }] : []));
  const doubled = usable.find((row, at) => usable.findIndex((other) => other.id === row.id) !== at);
  const unmatched = read.filter(({ component }) => !component);
  const unread = read.filter(({ component, molePercent }) => component && molePercent === null);

  const waitsFor =
    usable.length === 0
      ? "No row is read yet."
      : unmatched.length > 0
        ? `Not matched: ${unmatched.map(({ written }) => written).join(", ")}. Correct or remove these rows.`
        : unread.length > 0
          ? `No figure for ${unread.map(({ written }) => written).join(", ")}.`
          : doubled
            ? `${doubled.id.replaceAll("_", " ")} stands twice.`
            : undefined;

  return (
    <Dialog
      open={open}
      onClose={onClose}
      title="Paste a composition"
      actions={
        <>
          <Button
            kind="main"
            waitsFor={waitsFor}
            onClick={() => {
              onUse(
                pastedComposition(text).flatMap(({ component, typed, molePercent }) =>
                  component ? [{ id: component.id, typed, molePercent }] : [],
                ),
              );
              setText("");
            }}
          >
            {`Use ${usable.length} rows`}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </>
      }
    >
      <Labelled
        id={id}
        label="Two columns: component and mol %"
        hint="Names, formulas and CAS numbers are matched. The table in the form is replaced."
      >
        <TextArea id={id} value={text} onValueChange={setText} rows={8} />
      </Labelled>
      {read.length > 0 && (
        <table className="ruled mt-3">
          <caption className="sr-only">What was read</caption>
          <tbody>
            {read.map(({ written, component, typed, molePercent }, at) => (
              <tr key={at}>
                <th scope="row">{written}</th>
                <td className={component ? "" : "text-beyond"}>{component?.name ?? "not matched"}</td>
                <td className={`numeric ${molePercent === null ? "text-beyond" : ""}`}>
                  {molePercent === null ? `“${typed}”` : `${typed} mol %`}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </Dialog>
  );
}
