"use client";

import { Button } from "@/components/button/button";
import type { PreparedView } from "@/contracts/views";
import { dataCsv, dataFileName } from "./data-csv";
import { useShowing } from "./use-showing";

/** Saves the series of each case as a file, made in the browser from what the page shows. */
export function DataButton({ prepared }: { prepared: PreparedView }) {
  const showing = useShowing();
  return prepared.runs.map((run) => (
    <Button
      key={run.letter}
      kind="quiet"
      onClick={() => save(dataCsv(prepared.content, run, showing), dataFileName(prepared.content, run.letter))}
    >
      {prepared.runs.length > 1 ? `Data of case ${run.letter}, CSV` : "Data, CSV"}
    </Button>
  ));
}

function save(text: string, name: string): void {
  // The mark at the front tells spreadsheets that the file is UTF-8.
  const address = URL.createObjectURL(new Blob(["\ufeff", text], { type: "text/csv;charset=utf-8" }));
  const link = document.createElement("a");
  link.href = address;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
