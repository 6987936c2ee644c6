import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { BadgeMenu } from "@/components/shell/badge-menu";
import { Mark } from "@/components/shell/mark";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { Strip } from "@/components/shell/strip";
import { TitleBlock } from "@/components/shell/title-block";
import { ThemeSwitch } from "@/components/theme/theme-switch";
import { UnitSwitch } from "@/components/units/unit-switch";
import { EbbThumb } from "@/components/verdict/ebb-thumb";
import { StateWord } from "@/components/verdict/state-word";
import { SpecimenCharts } from "./charts";
import { SpecimenFields } from "./fields";
import { invented } from "./invented";
import { SpecimenResult } from "./result";
import { SpecimenSwatches } from "./swatches";
import { SpecimenWords } from "./words";

export const metadata: Metadata = { title: "Specimen" };

/** Every shared component on one page, for those who build and check the product. Only where the demo is loaded; all figures are invented. */
export default function SpecimenPage() {
  if (process.env.EBBMARK_DEMO !== "1") notFound();

  return (
    <>
      <Strip
        home="/specimen"
        menu={[
          { label: "Desk", href: "#desk" },
          { label: "Screenings", href: "#screenings", current: true },
          { label: "Sections", href: "#sections" },
          { label: "Fluids", href: "#fluids" },
          { label: "Log", href: "#log" },
        ]}
        tools={
          <>
            <UnitSwitch />
            <BadgeMenu badge="E-114" role="Engineer">
              <ThemeSwitch initial="system" />
            </BadgeMenu>
          </>
        }
      />
      <Sheet>
        <TitleBlock
          cells={[
            { label: "Record", value: "SC-0000" },
            { label: "Rev", value: "2" },
            { label: "Section", value: "IS-00 Invented section", wide: true },
            { label: "Case", value: "Cold blowdown", wide: true },
            { label: "Prepared by", value: "E-114" },
            { label: "State", value: <StateWord state="draft" /> },
            { label: "Kept", value: "14:32:08" },
          ]}
        />
        <SheetBody>
          <div className="mb-5 flex flex-wrap items-center gap-5">
            <Mark size={72} />
            <div className="flex-1">
              <h1 className="text-fig">Ebbmark specimen</h1>
              <p className="font-serif text-sub text-ink-3">STIX Two Text for what is said. Sofia Sans for what is measured.</p>
            </div>
            <EbbThumb ebb={invented.ebb} width={360} height={84} />
          </div>
          <SpecimenWords />
          <SpecimenFields />
          <SpecimenResult />
          <SpecimenCharts />
          <SpecimenSwatches />
        </SheetBody>
      </Sheet>
    </>
  );
}
