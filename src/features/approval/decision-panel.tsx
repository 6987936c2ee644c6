"use client";

import { useState, type ReactNode } from "react";
import type { PreparedView, ViewerView } from "@/contracts/views";
import { roleWords } from "@/contracts/roles";
import { isRefused } from "@/features/query/refused-error";
import { meanings } from "@/ledger/statements";
import { ConditionsEditor } from "./conditions-editor";
import { conditionsToSend, missingFor, remarksToSend, type Choice, type DecisionDraft } from "./decision";
import { RemarksEditor } from "./remarks-editor";
import { Receipt } from "./receipt";
import { isHeld, SignatureFields } from "./signature-fields";
import { useSignature, type SignedAct } from "./use-signature";

type Props = {
  screeningId: string;
  prepared: PreparedView;
  /** Badge of who prepared the revision. */
  author: string;
  acknowledged: ReadonlySet<string>;
  viewer: Pick<ViewerView, "badge" | "printedName" | "role">;
  method: string;
  onDone: () => void;
};

/** Countersign, countersign with conditions, or return with remarks; sent with the approver's own signature. */
export function DecisionPanel({ screeningId, prepared, author, acknowledged, viewer, method, onDone }: Props) {
  const { content, contentSha256 } = prepared;
  const [draft, setDraft] = useState<DecisionDraft>({
    choice: null,
    conditions: [],
    remarks: [{ key: 0, line: "", text: "" }],
    password: "",
  });
  const set = <K extends keyof DecisionDraft>(key: K, value: DecisionDraft[K]) =>
    setDraft((before) => ({ ...before, [key]: value }));
  const signature = useSignature({ screeningId, rev: content.rev, shownSha256: contentSha256 });
  const held = isHeld(signature);
  const { choice, password } = draft;
  const returns = choice === "return";

  const send = () => {
    const act: SignedAct = returns
      ? { act: "return", remarks: remarksToSend(draft.remarks, content) }
      : { act: "countersign", acknowledged: [...acknowledged], conditions: conditionsToSend(draft) };
    signature.mutate(
      { ...act, password },
      { onSuccess: onDone, onError: (error) => isRefused(error, "wrong-credentials") && set("password", "") },
    );
  };

  if (signature.data) {
    return (
      <Receipt
        title={returns ? `Returned to ${author}` : "Countersigned"}
        receipt={signature.data}
        screeningId={screeningId}
        rev={content.rev}
      >
        {returns
          ? "Your remarks are kept in the log. The answer is the next revision."
          : "The screening may be used as the basis for review under the local code, and no more."}
      </Receipt>
    );
  }

  return (
    <>
      <h2>Your decision</h2>
      <fieldset disabled={held} className="mt-2.5 border-t border-ink">
        <legend className="sr-only">Your decision</legend>
        <Option choice="countersign" current={choice} onChoose={(one) => set("choice", one)} label="Countersign">
          Read, and accepted as a basis for review, no more. Conditions may stand with it.
        </Option>
        <Option choice="return" current={choice} onChoose={(one) => set("choice", one)} label="Return with remarks">
          The record goes back to {author}. Your remarks are kept in the log.
        </Option>
      </fieldset>
      {choice === "countersign" && (
        <ConditionsEditor conditions={draft.conditions} onChange={(all) => set("conditions", all)} disabled={held} />
      )}
      {returns && (
        <RemarksEditor content={content} remarks={draft.remarks} onChange={(all) => set("remarks", all)} disabled={held} />
      )}
      {choice && (
        <>
          <p className="mt-4 border-b-3 border-t border-double border-ink py-3 font-serif text-meaning font-medium [border-top-style:solid]">
            {returns ? meanings.return : meanings.countersign}
          </p>
          <p className="pt-2 text-small text-ink-2">
            {viewer.printedName}, {roleWords[viewer.role]} {viewer.badge}. Time set by the server. {method}.
          </p>
        </>
      )}
      <SignatureFields
        screeningId={screeningId}
        signature={signature}
        password={password}
        onPassword={(text) => set("password", text)}
        missing={missingFor(draft, content, acknowledged)}
        onSend={send}
        label={returns ? `Return to ${author}` : "Countersign"}
        kind={returns ? "danger" : "main"}
      />
    </>
  );
}

function Option({
  choice,
  current,
  onChoose,
  label,
  children,
}: {
  choice: Choice;
  current: Choice | null;
  onChoose: (choice: Choice) => void;
  label: string;
  children: ReactNode;
}) {
  return (
    <label className="grid min-h-[52px] cursor-pointer grid-cols-[26px_minmax(0,1fr)] items-start gap-2.5 border-b py-2.5">
      <input
        type="radio"
        name="decision"
        className="mt-px h-[22px] w-[22px] accent-[var(--ink)] phone:h-[26px] phone:w-[26px]"
        checked={current === choice}
        onChange={() => onChoose(choice)}
        aria-describedby={`decision-${choice}`}
        aria-label={label}
      />
      <span>
        <b>{label}</b>
        <span id={`decision-${choice}`} className="block font-serif text-prose text-ink-2">
          {children}
        </span>
      </span>
    </label>
  );
}
