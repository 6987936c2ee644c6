"use client";

import { useState, type MouseEvent, type ReactNode } from "react";
import { AckList } from "@/components/caution/ack-list";
import { Button } from "@/components/button/button";
import { ButtonLink } from "@/components/button/button-link";
import { StepBar } from "@/components/parts/step-bar";
import { pages } from "@/contracts/paths";
import type { PreparedView, ViewerView } from "@/contracts/views";
import { DecisionPanel } from "./decision-panel";
import { missingAcknowledgements } from "./missing-words";
import { useAcknowledged } from "./use-acknowledged";

const steps = ["assumed", "governs", "holds", "cautions", "decide"] as const;
type Step = (typeof steps)[number];
const names: Record<Step, string> = {
  assumed: "Assumed",
  governs: "Governs",
  holds: "Holds",
  cautions: "Cautions",
  decide: "Decide",
};
const nextWords: Record<Step, string> = {
  assumed: "",
  governs: "2 What governs",
  holds: "3 Does it hold",
  cautions: "4 Cautions",
  decide: "5 Decide",
};

type Props = {
  screeningId: string;
  prepared: PreparedView;
  author: string;
  viewer: Pick<ViewerView, "badge" | "printedName" | "role">;
  method: string;
  /** The three questions, drawn from the signed content. */
  assumed: ReactNode;
  governs: ReactNode;
  holds: ReactNode;
};

/**
 * Three questions in order, the cautions, the decision. Side by side on a desk; on a phone five steps of one screen each, that can be left
 * and entered again; nothing is sent before the last.
 */
export function DecideDesk({ screeningId, prepared, author, viewer, method, assumed, governs, holds }: Props) {
  const { content } = prepared;
  const [step, setStep] = useState<Step>("assumed");
  const [been, setBeen] = useState<ReadonlySet<Step>>(new Set());
  const [done, setDone] = useState(false);
  const { acknowledged, toggle } = useAcknowledged();
  const at = steps.indexOf(step);
  const go = (next: Step) => {
    setBeen((before) => new Set(before).add(step));
    setStep(next);
    window.scrollTo({ top: 0 });
  };
  const followStep = (event: MouseEvent) => {
    const address = (event.target as HTMLElement).closest("a")?.getAttribute("href");
    const next = steps.find((one) => address === `#${one}`);
    if (!next) return;
    event.preventDefault();
    go(next);
  };
  const only = (one: Step) => (one === step ? "" : "phone:hidden");
  const next = steps[at + 1];
  const before = steps[at - 1];
  const stateOf = (one: Step) => (one === step ? "current" : been.has(one) ? "done" : "to-do");

  return (
    <>
      <div className="sticky top-0 z-20 hidden phone:block" onClickCapture={followStep}>
        <StepBar
          label="Steps of the decision"
          steps={steps.map((one) => ({ name: names[one], href: `#${one}`, state: stateOf(one) }))}
        />
      </div>
      <div className="grid grid-cols-[minmax(0,1fr)_430px] rail:grid-cols-[minmax(0,1fr)]">
        <div className={`min-w-0 px-gutter pb-6 pt-2.5 phone:px-4 ${step === "decide" ? "phone:hidden" : "phone:pb-24"}`}>
          <h1 className="sr-only">
            Decide on {content.record} rev {content.rev}
          </h1>
          <Question no="1" title="What was assumed" className={only("assumed")}>
            {assumed}
          </Question>
          <Question no="2" title="What governs" className={only("governs")}>
            {governs}
          </Question>
          <Question no="3" title="Does it hold" className={only("holds")}>
            {holds}
          </Question>
          <Question no="4" title="Cautions you acknowledge" className={only("cautions")}>
            <p className="text-small text-ink-3">
              {author} acknowledged them on signing. Each is stored with your countersign in the words shown here.
            </p>
            <AckList
              label="Cautions you acknowledge"
              items={content.cautions}
              acknowledged={acknowledged}
              onToggle={toggle}
              disabled={done}
            />
            <p className="py-2 text-small text-ink-2" role="status">
              {missingAcknowledgements(content.cautions, acknowledged) ?? "All are acknowledged."}
            </p>
          </Question>
        </div>
        <aside
          aria-label="Your decision"
          className={`border-l border-rule-2 bg-tint px-[26px] py-6 rail:border-l-0 rail:border-t phone:px-4 phone:pb-24 phone:pt-[18px] ${only("decide")}`}
        >
          <DecisionPanel
            screeningId={screeningId}
            prepared={prepared}
            author={author}
            acknowledged={acknowledged}
            viewer={viewer}
            method={method}
            onDone={() => setDone(true)}
          />
        </aside>
      </div>
      <div className="fixed inset-x-0 bottom-0 z-20 hidden grid-cols-[auto_1fr] gap-2.5 border-t border-rule-2 bg-sheet px-4 py-2.5 phone:grid">
        {before ? (
          <Button onClick={() => go(before)}>{names[before]}</Button>
        ) : (
          <ButtonLink href={pages.screening(screeningId)}>Close</ButtonLink>
        )}
        {next && (
          <Button kind="main" full onClick={() => go(next)}>
            {nextWords[next]}
          </Button>
        )}
      </div>
    </>
  );
}

function Question({ no, title, className, children }: { no: string; title: string; className: string; children: ReactNode }) {
  return (
    <section className={`grid grid-cols-[40px_minmax(0,1fr)] gap-x-2.5 pb-1.5 pt-5 phone:block ${className}`}>
      <span aria-hidden="true" className="font-serif text-[1.75rem] font-medium leading-none text-ink-3 phone:hidden">
        {no}
      </span>
      <div className="min-w-0">
        <h2 className="mb-1.5">{title}</h2>
        {children}
      </div>
    </section>
  );
}
