"use client";

import { useState } from "react";
import { Button } from "@/components/button/button";
import { Labelled } from "@/components/line/labelled";
import { PasswordField } from "@/components/line/password-field";
import { TextArea } from "@/components/line/text-area";
import { ActBlock, type ActProps } from "./act-block";

/** A first password, handed over in person. */
export function FirstPassword({ person, busy, send }: ActProps) {
  const [password, setPassword] = useState("");
  return (
    <ActBlock
      title="Set a first password"
      says="Hand it over in person. It must be changed at the next sign-in. Open sessions end at once, and a locked account opens. Stands in the security log."
    >
      <Labelled id="first-password" label="First password" hint="15 characters or more">
        <PasswordField
          id="first-password"
          autoComplete="new-password"
          value={password}
          onValueChange={setPassword}
          aria-describedby="first-password-message"
        />
      </Labelled>
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button
          busy={busy}
          waitsFor={password.length < 15 && "A first password has 15 characters or more."}
          onClick={() => {
            send(
              { act: "set-password", firstPassword: password },
              `${person.badge} has a first password, to be changed at the next sign-in.`,
            );
            setPassword("");
          }}
        >
          Set the password
        </Button>
      </div>
    </ActBlock>
  );
}

/** Disables or enables, for a reason. */
export function WithReason({
  title,
  says,
  label,
  kind,
  busy,
  onSend,
}: Pick<ActProps, "busy"> & {
  title: string;
  says: string;
  label: string;
  kind: "danger" | "plain";
  onSend: (reason: string) => void;
}) {
  const [reason, setReason] = useState("");
  return (
    <ActBlock title={title} says={says}>
      <Labelled id="account-reason" label="Reason">
        <TextArea id="account-reason" value={reason} onValueChange={setReason} maxLength={400} />
      </Labelled>
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button kind={kind} busy={busy} waitsFor={reason.trim() === "" && "Say why."} onClick={() => onSend(reason.trim())}>
          {label}
        </Button>
      </div>
    </ActBlock>
  );
}
