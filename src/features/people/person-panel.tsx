"use client";

import { useState } from "react";
import { Notice } from "@/components/caution/notice";
import { roleWords } from "@/contracts/roles";
import type { ChangePerson } from "@/contracts/requests";
import type { PersonDetailView } from "@/contracts/views";
import { isRefused, wordsOf } from "@/features/query/refused-error";
import { FirstPassword, WithReason } from "./account-acts";
import { Proposal, RoleChange } from "./role-acts";
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
  const send = (body: ChangePerson, words: string) => {
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
