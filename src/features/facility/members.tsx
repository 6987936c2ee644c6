"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { ChoiceField } from "@/components/line/choice-field";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { endpoints } from "@/contracts/paths";
import type { ChangeMembers } from "@/contracts/requests";
import { roleWords } from "@/contracts/roles";
import type { FacilityView, PersonView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";
import { wordsOf } from "@/features/query/refused-error";

/**
 * Who belongs to a facility.
 *
 * people   everybody who could be added; left out for viewers who may only read
 */
export function Members({ facility, people }: { facility: FacilityView; people?: readonly PersonView[] }) {
  const router = useRouter();
  const [chosen, setChosen] = useState("");
  const change = useMutation({
    mutationFn: (body: ChangeMembers) => postJson<FacilityView>(endpoints.members(facility.id), body),
    onSuccess: () => {
      setChosen("");
      router.refresh();
    },
  });
  const belongs = new Set(facility.members.map(({ id }) => id));
  const addable = (people ?? []).filter(
    ({ id, active, role }) => active && !belongs.has(id) && (role === "engineer" || role === "approver"),
  );

  return (
    <section>
      <h2 className="mb-1">Members</h2>
      {facility.members.length === 0 ? (
        <p className="border-t py-3 font-serif text-prose text-ink-2">Nobody belongs to it yet, so nobody can screen here.</p>
      ) : (
        <Table caption={`Members of ${facility.name}`}>
          <thead>
            <tr>
              <HeadCell>Badge</HeadCell>
              <HeadCell>Printed name</HeadCell>
              <HeadCell>Role</HeadCell>
              {people && <HeadCell />}
            </tr>
          </thead>
          <tbody>
            {facility.members.map((person) => (
              <Row key={person.id}>
                <Cell strong unbroken>
                  {person.badge}
                </Cell>
                <Cell>{person.printedName}</Cell>
                <Cell label="Role">
                  {roleWords[person.role]}
                  {!person.active && <span className="text-ink-3">, disabled</span>}
                </Cell>
                {people && (
                  <Cell>
                    <Button
                      kind="quiet"
                      aria-label={`Remove ${person.badge}`}
                      busy={change.isPending}
                      onClick={() => change.mutate({ act: "remove", personId: person.id })}
                    >
                      Remove
                    </Button>
                  </Cell>
                )}
              </Row>
            ))}
          </tbody>
        </Table>
      )}
      {people && (
        <div className="mt-4 flex flex-wrap items-center gap-3">
          <span className="w-[320px] max-w-full">
            <ChoiceField
              label="Person to add"
              value={chosen}
              prompt={addable.length > 0 ? "Choose a person" : "Every engineer and approver belongs already"}
              options={addable.map(({ id, badge, printedName, role }) => ({
                value: id,
                label: `${badge} ${printedName}, ${roleWords[role].toLowerCase()}`,
              }))}
              onValueChange={setChosen}
            />
          </span>
          <Button
            busy={change.isPending}
            waitsFor={chosen === "" && "Choose who is to be added."}
            onClick={() => change.mutate({ act: "add", personId: chosen })}
          >
            Add
          </Button>
        </div>
      )}
      {people && <p className="pt-2 text-small text-ink-3">Adding and removing are log entries.</p>}
      {change.isError && (
        <div className="mt-3">
          <Notice tone="error">{wordsOf(change.error)}</Notice>
        </div>
      )}
    </section>
  );
}
