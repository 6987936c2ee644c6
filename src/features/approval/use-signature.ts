"use client";

import { useMutation } from "@tanstack/react-query";
import { useRef } from "react";
import { endpoints } from "@/contracts/paths";
import type { OpenCeremony, Remark } from "@/contracts/requests";
import type { CeremonyView, ReceiptView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";
import { isRefused } from "@/features/query/refused-error";

/** What each act carries beside the password. */
export type SignedAct =
  | { act: "sign"; acknowledged: string[] }
  | { act: "countersign"; acknowledged: string[]; conditions: string[] }
  | { act: "return"; remarks: Remark[] }
  | { act: "withdraw"; reason: string };

const addressOf = {
  sign: endpoints.sign,
  countersign: endpoints.countersign,
  return: endpoints.giveBack,
  withdraw: endpoints.withdraw,
} as const;

type Shown = { screeningId: string; rev: number; shownSha256: string };
type Sent = SignedAct & { password: string };

/**
 * Sends a signature for what this page shows.
 *
 * The signing page is opened on the server when the button is pressed, so reading may take as long as it takes. Its nonce and key are kept
 * until an answer comes: the same sent again is the same act, and gets the first receipt. A page that expired before anything was recorded
 * is opened anew.
 */
export function useSignature({ screeningId, rev, shownSha256 }: Shown) {
  const opened = useRef<{ act: OpenCeremony["act"]; ceremony: CeremonyView } | null>(null);

  const ceremonyFor = async (act: OpenCeremony["act"]): Promise<CeremonyView> => {
    if (opened.current?.act !== act) {
      const ceremony = await postJson<CeremonyView>(endpoints.ceremony(screeningId), { act, rev } satisfies OpenCeremony);
      opened.current = { act, ceremony };
    }
    return opened.current.ceremony;
  };

  const send = async ({ act, ...content }: Sent): Promise<ReceiptView> => {
    const { nonce, idempotencyKey } = await ceremonyFor(act);
    return postJson<ReceiptView>(addressOf[act](screeningId), { rev, nonce, idempotencyKey, shownSha256, ...content });
  };

  return useMutation({
    mutationFn: async (sent: Sent) => {
      try {
        return await send(sent);
      } catch (error) {
        if (!isRefused(error, "ceremony-expired")) throw error;
        opened.current = null;
        return send(sent);
      }
    },
  });
}

export type Signature = ReturnType<typeof useSignature>;
