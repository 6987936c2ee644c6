import type { TitleCell } from "@/components/shell/title-block";
import type { ScreeningView } from "@/contracts/views";

/** The cells that every page of a record opens with, but for its state. */
export function recordTitle(screening: ScreeningView): TitleCell[] {
  const { record, rev, section, facility, title, author } = screening;
  return [
    { label: "Record", value: record },
    { label: "Rev", value: rev },
    { label: "Section", value: `${section.tag} ${section.name}`, wide: true },
    { label: "Title", value: title, wide: true },
    { label: "Facility", value: `${facility.name}${facility.demo ? ", demo" : ""}` },
    { label: "Prepared by", value: author.badge },
  ];
}
