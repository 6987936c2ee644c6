"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/button/button";
import { Dialog } from "@/components/dialog/dialog";
import { Labelled } from "@/components/line/labelled";
import { TextArea } from "@/components/line/text-area";
import type { PreparedView } from "@/contracts/views";
import { isRefused } from "@/features/query/refused-error";
import { meanings } from "@/ledger/statements";
import { Receipt } from "./receipt";
import { isHeld, SignatureFields } from "./signature-fields";
import { useSignature } from "./use-signature";

/** Takes a signed revision back, for a reason and with a signature. It stays in the log. */
export function WithdrawButton({ screeningId, prepared }: { screeningId: string; prepared: PreparedView }) {
  const { content, contentSha256 } = prepared;
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState("");
  const [password, setPassword] = useState("");
  const signature = useSignature({ screeningId, rev: content.rev, shownSha256: contentSha256 });
  const receipt = signature.data;
  const missing = reason.trim() === "" ? "Say why it is withdrawn." : password === "" ? "Type your password." : null;
  const close = () => {
    setOpen(false);
    setPassword("");
    if (receipt) router.refresh();
  };
  return (
    <>
      <Button kind="danger" onClick={() => setOpen(true)}>
        Withdraw
      </Button>
      <Dialog open={open} onClose={close} title={`Withdraw ${content.record} rev ${content.rev}`}>
        {receipt ? (
          <Receipt title="Withdrawn" receipt={receipt} screeningId={screeningId} rev={content.rev}>
            The revision stays in the log and must not be used any longer.
          </Receipt>
        ) : (
          <>
            <p className="border-b-3 border-t border-double border-ink py-3 font-serif text-meaning [border-top-style:solid]">
              {meanings.withdraw}
            </p>
            <Labelled id="withdraw-reason" label="Reason" hint="Stands in the log.">
              <TextArea
                id="withdraw-reason"
                value={reason}
                onValueChange={setReason}
                maxLength={1200}
                readOnly={isHeld(signature)}
                aria-describedby="withdraw-reason-message"
              />
            </Labelled>
            <SignatureFields
              screeningId={screeningId}
              signature={signature}
              password={password}
              onPassword={setPassword}
              missing={missing}
              label="Withdraw"
              kind="danger"
              onSend={() =>
                signature.mutate(
                  { act: "withdraw", reason: reason.trim(), password },
                  { onError: (error) => isRefused(error, "wrong-credentials") && setPassword("") },
                )
              }
            />
          </>
        )}
      </Dialog>
    </>
  );
}
