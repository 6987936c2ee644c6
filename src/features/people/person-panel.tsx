"use client";

import { useState, type ReactNode } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { ChoiceField } from "@/components/line/choice-field";
import { Labelled } from "@/components/line/labelled";
import { PasswordField } from "@/components/line/password-field";
import { TextArea } from "@/components/line/text-area";
import { roles, roleWords, type Role } from "@/contracts/roles";
import type { PersonDetailView } from "@/contracts/views";
import { isRefused, wordsOf } from "@/features/query/refused-error";
import { useChangePerson } from "./use-change-person";

type Props = {
  person: PersonDetailView;
  /** The rule of two is bound: a change of role waits for another administrator. */
  takesTwo: boolean;
};

/** Everything an administrator can do to one account, each with what it leaves in the log. */
export function PersonPanel({ person, takesTwo }: Props) {
  const change = useChangePerson(person.id);
  const [done, setDone] = useState<string | null>(null);
  const send = (body: Parameters<typeof change.mutate>[0], words: string) => {
    setDone(null);
    change.mutate(body, { onSuccess: () => setDone(words) });
  };
  const shared = { person, busy: change.isPending, send };

  return (
    <section aria-label={`Account of ${person.badge}`}>
      <h2>
        {person.badge}, {roleWords[person.role].toLowerCase()}
      </h2>
      <p className="pb-2 font-serif text-prose text-ink-2">
        {person.printedName}
        {!person.active && ". The account is disabled."}
      </p>
      <p role="status" className="font-semibold [&:not(:empty)]:border-y [&:not(:empty)]:py-2.5">
        {done}
      </p>
      {change.isError && (
        <Notice tone="error">
          {wordsOf(change.error)}
          {isRefused(change.error, "invalid-request") &&
            change.error.problem.problems?.map(({ path, message }) => <span key={path}> {message}</span>)}
        </Notice>
      )}
      {person.proposedRole && <Proposal {...shared} takesTwo={takesTwo} />}
      {person.active ? (
        <>
          {!person.proposedRole && <RoleChange {...shared} takesTwo={takesTwo} />}
          <FirstPassword {...shared} />
          <WithReason
            {...shared}
            title="Disable the account"
            says="Becomes a log entry. Open sessions end at once; signatures stay."
            label={`Disable ${person.badge}`}
            kind="danger"
            onSend={(reason) => send({ act: "disable", reason }, `${person.badge} is disabled. It is in the log.`)}
          />
        </>
      ) : (
        <WithReason
          {...shared}
          title="Enable the account again"
          says="Becomes a log entry."
          label={`Enable ${person.badge}`}
          kind="plain"
          onSend={(reason) => send({ act: "re-enable", reason }, `${person.badge} is enabled again. It is in the log.`)}
        />
      )}
    </section>
  );
}

type Shared = {
  person: PersonDetailView;
  busy: boolean;
  send: (body: Parameters<ReturnType<typeof useChangePerson>["mutate"]>[0], words: string) => void;
};

function Block({ title, says, children }: { title: string; says: string; children: ReactNode }) {
  return (
    <div className="mt-5 border-t border-ink pt-3">
      <h3>{title}</h3>
      <p className="font-serif text-note text-ink-2">{says}</p>
      {children}
    </div>
  );
}

function Proposal({ person, busy, send, takesTwo }: Shared & { takesTwo: boolean }) {
  const { proposedRole, badge } = person;
  if (!proposedRole) return null;
  const { role, mine } = proposedRole;
  return (
    <Block
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
    </Block>
  );
}

function RoleChange({ person, busy, send, takesTwo }: Shared & { takesTwo: boolean }) {
  const [role, setRole] = useState<Role | "">("");
  const [reason, setReason] = useState("");
  const others = roles.filter((one) => one !== person.role);
  const missing = role === "" ? "Choose the new role." : reason.trim() === "" ? "Say why." : null;
  const words = takesTwo
    ? `Proposed. Another administrator confirms it. It is in the log.`
    : `${person.badge} has the new role. Both entries are in the log.`;
  return (
    <Block
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
    </Block>
  );
}

function FirstPassword({ person, busy, send }: Shared) {
  const [password, setPassword] = useState("");
  return (
    <Block
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
    </Block>
  );
}

function WithReason({
  title,
  says,
  label,
  kind,
  busy,
  onSend,
}: Pick<Shared, "busy"> & {
  title: string;
  says: string;
  label: string;
  kind: "danger" | "plain";
  onSend: (reason: string) => void;
}) {
  const [reason, setReason] = useState("");
  return (
    <Block title={title} says={says}>
      <Labelled id="account-reason" label="Reason">
        <TextArea id="account-reason" value={reason} onValueChange={setReason} maxLength={400} />
      </Labelled>
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button kind={kind} busy={busy} waitsFor={reason.trim() === "" && "Say why."} onClick={() => onSend(reason.trim())}>
          {label}
        </Button>
      </div>
    </Block>
  );
}
