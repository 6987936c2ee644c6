"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { Dialog } from "@/components/dialog/dialog";
import { Labelled } from "@/components/line/labelled";
import { TextArea } from "@/components/line/text-area";
import { endpoints, pages } from "@/contracts/paths";
import type { NewRevision } from "@/contracts/requests";
import { postJson } from "@/features/query/fetch-json";
import { wordsOf } from "@/features/query/refused-error";

/**
 * Opens the next revision with the lines of this one, once its reason is given. The reason stands on the record.
 *
 * returned   this revision was returned: the new one answers its remarks
 */
export function NewRevisionButton({ screeningId, rev, returned }: { screeningId: string; rev: number; returned: boolean }) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState("");
  const create = useMutation({
    mutationFn: (body: NewRevision) => postJson<{ id: string; rev: number }>(endpoints.revisions(screeningId), body),
    onSuccess: ({ id }) => router.push(pages.part(id, "scope")),
  });
  return (
    <>
      <Button kind="main" onClick={() => setOpen(true)}>
        {returned ? "Answer in a new revision" : "New revision"}
      </Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title={`Open revision ${rev + 1}`}
        actions={
          <>
            <Button
              kind="main"
              busy={create.isPending}
              waitsFor={reason.trim() === "" && "Say why a new revision is made."}
              onClick={() => create.mutate({ fromRev: rev, reason: reason.trim() })}
            >
              Open revision {rev + 1}
            </Button>
            <Button kind="quiet" onClick={() => setOpen(false)}>
              Not now
            </Button>
          </>
        }
      >
        <p className="font-serif text-prose text-ink-2">
          It starts with the lines of revision {rev}. Revision {rev} stays as it is
          {returned ? ", with its remarks" : ", and stands until the new one is signed"}.
        </p>
        <Labelled id="revision-reason" label="Reason" hint="Stands on the record.">
          <TextArea
            id="revision-reason"
            value={reason}
            onValueChange={setReason}
            maxLength={600}
            aria-describedby="revision-reason-message"
          />
        </Labelled>
        {create.isError && (
          <div className="mt-3">
            <Notice tone="error">{wordsOf(create.error)}</Notice>
          </div>
        )}
      </Dialog>
    </>
  );
}
