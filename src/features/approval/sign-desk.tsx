"use client";

import Link from "next/link";
import { useState, type ReactNode } from "react";
import { AckList } from "@/components/caution/ack-list";
import { Notice } from "@/components/caution/notice";
import { Digest, SignLayout, SignPanel } from "@/components/sign/sign-panel";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { pages } from "@/contracts/paths";
import { parseLineKey } from "@/contracts/lines/registry";
import { partByNumber } from "@/contracts/lines/parts";
import { roleWords } from "@/contracts/roles";
import type { PreparedView, ViewerView } from "@/contracts/views";
import { isRefused } from "@/features/query/refused-error";
import { meanings } from "@/ledger/statements";
import { ChangedSince } from "./changed-since";
import { missingAcknowledgements } from "./missing-words";
import { Receipt } from "./receipt";
import { isHeld, SignatureFields } from "./signature-fields";
import { useAcknowledged } from "./use-acknowledged";
import { useSignature } from "./use-signature";

export type Blocker = { path: string; message: string };

type Props = {
  screeningId: string;
  prepared: PreparedView;
  /** Lines that nobody has given a source for: they must be settled first. */
  blockers: readonly Blocker[];
  viewer: Pick<ViewerView, "badge" | "printedName" | "role">;
  /** "Password again (demo policy)" */
  method: string;
  /** The limits of the record, as the sheet shows them. */
  children: ReactNode;
};

/** Review and sign: drawn from the stored content alone, which the signature names by its digest. */
export function SignDesk({ screeningId, prepared, blockers, viewer, method, children }: Props) {
  const { content, contentSha256 } = prepared;
  const [password, setPassword] = useState("");
  const { acknowledged, toggle } = useAcknowledged();
  const signature = useSignature({ screeningId, rev: content.rev, shownSha256: contentSha256 });
  const receipt = signature.data;
  const missing =
    blockers.length > 0
      ? `${blockers.length === 1 ? "One line has" : `${blockers.length} lines have`} no source: ${blockers.map(({ path }) => path).join(", ")}.`
      : (missingAcknowledgements(content.cautions, acknowledged) ?? (password === "" ? "Type your password." : null));

  return (
    <SignLayout
      panel={
        <SignPanel
          title="Your signature"
          meaning={meanings.sign}
          facts={[
            { label: "Signing as", value: <b>{`${viewer.printedName}, ${roleWords[viewer.role]} ${viewer.badge}`}</b> },
            { label: "Record", value: <b>{`${content.record} rev ${content.rev}`}</b> },
            { label: "Content digest", value: <Digest hex={contentSha256} short /> },
            { label: "Time of signing", value: "set by the server" },
            { label: "Signs with", value: method },
          ]}
          after={!receipt && `After signing, the record can’t be edited. A change makes revision ${content.rev + 1}.`}
        >
          {receipt ? (
            <div className="mt-5">
              <Receipt title="Signed and handed over" receipt={receipt} screeningId={screeningId} rev={content.rev}>
                It waits for the countersign of an approver of {content.facility.name}.
              </Receipt>
            </div>
          ) : (
            <SignatureFields
              screeningId={screeningId}
              signature={signature}
              password={password}
              onPassword={setPassword}
              missing={missing}
              label="Sign and hand over"
              onSend={() =>
                signature.mutate(
                  { act: "sign", acknowledged: [...acknowledged], password },
                  { onError: (error) => isRefused(error, "wrong-credentials") && setPassword("") },
                )
              }
            />
          )}
        </SignPanel>
      }
    >
      <h1 className="mb-3.5">Review and sign</h1>
      <p className="border-b border-ink pb-3.5 font-serif text-meaning">
        <span className="font-num">
          <VerdictWord verdict={content.verdict} />
        </span>
        {"\u2002"}
        {content.sentence}
      </p>
      {blockers.length > 0 && (
        <div className="mt-5">
          <Notice tone="error" title="These lines stand in the way.">
            <ul className="pt-1">
              {blockers.map(({ path, message }) => (
                <li key={path}>
                  <BlockerLink screeningId={screeningId} path={path} /> {message}
                </li>
              ))}
            </ul>
          </Notice>
        </div>
      )}
      <div className="mt-4">{children}</div>
      <h2 className="mb-1 mt-6">Cautions you acknowledge</h2>
      <p className="text-small text-ink-3">Each is stored with your signature in the words shown here.</p>
      <AckList
        label="Cautions you acknowledge"
        items={content.cautions}
        acknowledged={acknowledged}
        onToggle={toggle}
        disabled={isHeld(signature) || Boolean(receipt)}
      />
      <ChangedSince content={content} />
    </SignLayout>
  );
}

function BlockerLink({ screeningId, path }: { screeningId: string; path: string }) {
  const line = parseLineKey(path)?.line;
  return line ? (
    <Link href={pages.part(screeningId, partByNumber(line.part).slug, path)} className="font-cond text-label">
      {path}
    </Link>
  ) : (
    <b className="font-cond text-label">{path}</b>
  );
}
