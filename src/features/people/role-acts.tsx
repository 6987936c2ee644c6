"use client";

import { useState } from "react";
import { Button } from "@/components/button/button";
import { ChoiceField } from "@/components/line/choice-field";
import { Labelled } from "@/components/line/labelled";
import { TextArea } from "@/components/line/text-area";
import { roles, roleWords, type Role } from "@/contracts/roles";
import { ActBlock, type ActProps } from "./act-block";

/** A change of role that is half done: the other administrator confirms it. */
export function Proposal({ person, busy, send, takesTwo }: ActProps & { takesTwo: boolean }) {
  const { proposedRole, badge } = person;
  if (!proposedRole) return null;
  const { role, mine } = proposedRole;
  return (
    <ActBlock
      title={`${badge}: ${roleWords[person.role]} to ${roleWords[role]}, half done`}
      says="A change of role takes two administrators. Neither can be the person it is about."
    >
      {mine && takesTwo ? (
        <p className="pt-2 font-serif text-prose">You proposed it. Another administrator confirms.</p>
      ) : (
        <div className="pt-3">
          <Button
            kind="main"
            busy={busy}
            onClick={() =>
              send({ act: "confirm-role", role }, `${badge} is ${roleWords[role].toLowerCase()} now. It is in the log.`)
            }
          >
            Confirm as {roleWords[role].toLowerCase()}
          </Button>
          <p className="pt-2 text-small text-ink-3">Becomes a log entry with both names. Sessions of {badge} end at once.</p>
        </div>
      )}
    </ActBlock>
  );
}

/** Changes the role at once, or proposes it where two administrators are needed. */
export function RoleChange({ person, busy, send, takesTwo }: ActProps & { takesTwo: boolean }) {
  const [role, setRole] = useState<Role | "">("");
  const [reason, setReason] = useState("");
  const others = roles.filter((one) => one !== person.role);
  const missing = role === "" ? "Choose the new role." : reason.trim() === "" ? "Say why." : null;
  const words = takesTwo
    ? `Proposed. Another administrator confirms it. It is in the log.`
    : `${person.badge} has the new role. Both entries are in the log.`;
  return (
    <ActBlock
      title="Change the role"
      says={
        takesTwo
          ? "Becomes a log entry, and waits for another administrator."
          : "Becomes two log entries. There is one administrator, so it takes effect at once, and the entries say so."
      }
    >
      <Labelled id="new-role" label="New role">
        <ChoiceField
          id="new-role"
          value={role}
          prompt="Choose a role"
          options={others.map((one) => ({ value: one, label: roleWords[one] }))}
          onValueChange={(value) => setRole(value as Role)}
        />
      </Labelled>
      <Labelled id="role-reason" label="Reason">
        <TextArea id="role-reason" value={reason} onValueChange={setReason} maxLength={400} />
      </Labelled>
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button
          busy={busy}
          waitsFor={missing}
          onClick={() => role !== "" && send({ act: "change-role", role, reason: reason.trim() }, words)}
        >
          {takesTwo ? "Propose the change" : "Change the role"}
        </Button>
      </div>
    </ActBlock>
  );
}
