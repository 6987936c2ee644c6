"use client";

import { useState } from "react";
import { Button } from "@/components/button/button";
import { AckList } from "@/components/caution/ack-list";
import { Notice } from "@/components/caution/notice";
import { Dialog } from "@/components/dialog/dialog";
import { ChoiceField } from "@/components/line/choice-field";
import { Line } from "@/components/line/line";
import { LineJump } from "@/components/line/line-jump";
import { focusLine } from "@/components/line/next-line";
import { RadioRow } from "@/components/line/radio-row";
import { SourceButton, SourceKeys, SourceNote } from "@/components/line/source-note";
import { TextField } from "@/components/line/text-field";
import { UnitField } from "@/components/line/unit-field";
import { PartList } from "@/components/parts/part-list";
import { ButtonRow, GroupHead, PartHead } from "@/components/shell/page-head";
import { EmptyState } from "@/components/states/empty-state";
import { Stop } from "@/components/states/stop";
import { WaitingLines } from "@/components/states/waiting";

/** A part of the form with a line in every state, and what stands where something is missing or wrong. */
export function SpecimenFields() {
  const [thickness, setThickness] = useState("25.4");
  const [unit, setUnit] = useState("mm");
  const [steel, setSteel] = useState("carbon");
  const [wall, setWall] = useState("lumped");
  const [acknowledged, setAcknowledged] = useState<ReadonlySet<string>>(new Set(["C1"]));
  const [asking, setAsking] = useState(false);

  return (
    <section className="mt-9 grid grid-cols-[188px_minmax(0,1fr)] border-y border-rule-2 phone:block print:block">
      <PartList
        groups={[
          {
            head: "For all cases",
            parts: [
              { no: 1, name: "Scope", href: "#line-4.01", note: "9 of 9 settled", state: "settled" },
              { no: 2, name: "Inventory", href: "#line-4.02", note: "11 of 11 settled", state: "settled" },
              { no: 3, name: "Fluid", href: "#line-4.03", note: "3 of 6 settled", state: "started" },
              { no: 4, name: "Steel", href: "#line-4.04", note: "6 of 7 settled", state: "started", current: true },
            ],
          },
          {
            head: "For case A",
            parts: [
              { no: 5, name: "Release path", href: "#line-5.04", note: "1 line to fix", state: "to-fix" },
              { no: 6, name: "Heat", href: "#line-4.08", note: "not begun", state: "untouched" },
              { no: 7, name: "Limits", href: "#line-4.09", note: "1 without source", state: "without-source" },
            ],
          },
        ]}
      />
      <div className="min-w-0 px-6 py-5 phone:px-0">
        <PartHead no={4} title="Steel">
          <SourceKeys />
        </PartHead>
        <GroupHead>Shell</GroupHead>
        <Line
          no="4.01"
          label="Vessel"
          hint="tag on the nameplate"
          source={<SourceNote kind="sheet">DS-0000 rev C, p. 1</SourceNote>}
        >
          <TextField value="V-0000" onValueChange={() => {}} />
        </Line>
        <Line
          no="4.02"
          label="Steel"
          hint="sets heat capacity"
          source={<SourceNote kind="sheet">DS-0000 rev C, line 22</SourceNote>}
        >
          <ChoiceField
            value={steel}
            onValueChange={setSteel}
            options={[
              { value: "carbon", label: "Carbon steel, normalised" },
              { value: "austenitic", label: "Austenitic stainless steel" },
            ]}
          />
        </Line>
        <Line
          no="4.03"
          label="Wall thickness"
          hint="nominal less corrosion allowance"
          changed="31.8 mm in rev 1"
          source={<SourceNote kind="derived">31.8 less 6.4, both DS-0000 rev C</SourceNote>}
        >
          <UnitField
            value={thickness}
            onValueChange={setThickness}
            unit={unit}
            onUnitChange={setUnit}
            units={["mm", "m", "in", "ft"]}
          />
        </Line>
        <Line
          no="4.04"
          label="Inside surface in contact with gas"
          tone="derived"
          source={<SourceNote kind="derived">from line 2.04</SourceNote>}
        >
          <UnitField value="71.0" unit="m²" />
        </Line>
        <Line
          no="4.06"
          label="Film coefficient, inside"
          hint="free convection; coarse value"
          source={<SourceNote kind="assumed">no measurement</SourceNote>}
          message={{ tone: "warn", text: "Assumed. Halving it leaves the wall warmer and the fluid colder." }}
        >
          <UnitField value="150" unit="W/(m²·K)" units={["W/(m²·K)", "Btu/(h·ft²·°F)"]} onUnitChange={() => {}} />
        </Line>
        <Line
          no="5.04"
          label="Back pressure at full flow"
          hint="2.20 bar(a) in rev 1"
          source={<SourceButton kind="missing" label="Source of back pressure" onOpen={() => {}} />}
          message={{
            tone: "bad",
            text: (
              <>
                <b>319 psig is 10 times the value in rev 1.</b> The cited table is in absolute pressure. Did you mean 17.2 psig?
              </>
            ),
          }}
        >
          <UnitField value="319" unit="psig" units={["psig", "psia", "bar(g)", "bar(a)"]} onUnitChange={() => {}} />
        </Line>
        <Line no="4.08" label="Wall" group source={<SourceNote kind="assumed">uninsulated shell</SourceNote>}>
          <RadioRow
            value={wall}
            onValueChange={setWall}
            options={[
              { value: "none", label: "None", phrase: "the gas alone cools" },
              { value: "lumped", label: "Lumped", phrase: "one temperature through the steel" },
            ]}
          />
        </Line>
        <Line
          no="4.09"
          label="Wall temperature at start"
          tone="locked"
          source={<SourceNote kind="measured">TT-0000, lowest of 3 winters</SourceNote>}
        >
          <UnitField value="8.5" unit="°C" />
        </Line>
        <LineJump onJump={focusLine} />
        <ButtonRow>
          <Button>3 Fluid</Button>
          <Button kind="main" onClick={() => setAsking(true)}>
            Ask something
          </Button>
          <Button kind="quiet" waitsFor="Full computation waits for line 5.04.">
            Compute in full
          </Button>
        </ButtonRow>
        <Dialog
          open={asking}
          onClose={() => setAsking(false)}
          title="Withdraw the record"
          actions={
            <>
              <Button kind="danger" onClick={() => setAsking(false)}>
                Withdraw it
              </Button>
              <Button kind="quiet" onClick={() => setAsking(false)}>
                Keep it
              </Button>
            </>
          }
        >
          <p className="font-serif text-prose text-ink-2">
            Nobody can rely on it afterwards. The log keeps it, with your reason.
          </p>
        </Dialog>
        <div className="mt-6 grid gap-6">
          <Notice tone="error" title="Not kept since 14:36.">
            The connection is lost. Your lines are held in this browser; don’t close the page. <a href="#again">Try again</a>
          </Notice>
          <Notice tone="caution" title="The policy was revised.">
            Line 7.02 still shows the value of LP-1 rev 1.
          </Notice>
          <AckList
            label="Cautions you acknowledge"
            items={[
              { id: "C1", words: "This is a screening. It does not size, rate or approve equipment." },
              { id: "C2", words: "One gas temperature and one wall temperature stand for the whole vessel." },
            ]}
            acknowledged={acknowledged}
            onToggle={(id, on) =>
              setAcknowledged(new Set(on ? [...acknowledged, id] : [...acknowledged].filter((other) => other !== id)))
            }
          />
          <div className="grid grid-cols-3 gap-8 rail:grid-cols-1">
            <EmptyState axes title="Nothing has been screened here yet" action={<Button kind="main">New screening</Button>}>
              Start with the isolatable section: what it holds, how it is walled in, and where it vents to.
            </EmptyState>
            <Stop serious title="The run stopped at 11.2 min" action={<Button>Go to line 3.02</Button>}>
              The fluid reached −92.4 °C, below the range of the heat-capacity data. Nothing after that moment is shown.
            </Stop>
            <WaitingLines />
          </div>
        </div>
      </div>
    </section>
  );
}
