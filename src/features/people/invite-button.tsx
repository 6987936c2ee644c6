"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useId, useState, type FormEvent } from "react";
import { Button } from "@/components/button/button";
import { CheckBox } from "@/components/caution/check-box";
import { Notice } from "@/components/caution/notice";
import { Dialog } from "@/components/dialog/dialog";
import { ChoiceField } from "@/components/line/choice-field";
import { Labelled } from "@/components/line/labelled";
import { PasswordField } from "@/components/line/password-field";
import { TextField } from "@/components/line/text-field";
import { endpoints, pages } from "@/contracts/paths";
import { invitePersonSchema, type InvitePerson } from "@/contracts/requests";
import { roles, roleWords, type Role } from "@/contracts/roles";
import type { PersonDetailView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";
import { isRefused, wordsOf } from "@/features/query/refused-error";

type Field = "badge" | "printedName" | "firstPassword";

const wrongWords: Record<Field, string> = {
  badge: "A badge has letters, a hyphen and digits, such as E-120.",
  printedName: "Give the name as it stands beside a signature.",
  firstPassword: "Use 15 characters or more.",
};

/** Enrols a person with a first password that is handed over in person. */
export function InviteButton({ facilities }: { facilities: readonly { id: string; name: string }[] }) {
  const router = useRouter();
  const form = useId();
  const [open, setOpen] = useState(false);
  const [fields, setFields] = useState({ badge: "", printedName: "", firstPassword: "" });
  const [role, setRole] = useState<Role>("engineer");
  const [facilityIds, setFacilityIds] = useState<string[]>([]);
  const [wrong, setWrong] = useState<Partial<Record<Field, string>>>({});
  const set = (name: Field) => (value: string) => setFields((before) => ({ ...before, [name]: value }));
  const takesFacilities = role === "engineer" || role === "approver";

  const invite = useMutation({
    mutationFn: (body: InvitePerson) => postJson<PersonDetailView>(endpoints.people, body),
    onSuccess: ({ id }) => {
      setOpen(false);
      setFields({ badge: "", printedName: "", firstPassword: "" });
      router.push(`${pages.people}?person=${id}`);
      router.refresh();
    },
    onError: (error) => {
      if (!isRefused(error)) return;
      const found = (["badge", "printedName", "firstPassword"] as const).flatMap((name) => {
        const message = error.problemAt(name);
        return message ? [[name, message] as const] : [];
      });
      setWrong(Object.fromEntries(found));
    },
  });

  const submit = (event: FormEvent) => {
    event.preventDefault();
    const parsed = invitePersonSchema.safeParse({ ...fields, role, facilityIds: takesFacilities ? facilityIds : [] });
    const paths = new Set(parsed.error?.issues.map(({ path }) => path[0]));
    setWrong(
      Object.fromEntries(
        (Object.keys(wrongWords) as Field[]).filter((name) => paths.has(name)).map((name) => [name, wrongWords[name]]),
      ),
    );
    if (parsed.success) invite.mutate(parsed.data);
  };

  return (
    <>
      <Button kind="main" onClick={() => setOpen(true)}>
        Invite a person
      </Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title="Invite a person"
        actions={
          <>
            <Button kind="main" type="submit" form={form} busy={invite.isPending}>
              Invite
            </Button>
            <Button kind="quiet" onClick={() => setOpen(false)}>
              Not now
            </Button>
          </>
        }
      >
        <p className="font-serif text-prose text-ink-2">
          Becomes a log entry, as does each facility. A badge is never given to another person.
        </p>
        <form id={form} onSubmit={submit} noValidate>
          <Labelled id="invite-badge" label="Badge" error={wrong.badge}>
            <TextField
              id="invite-badge"
              value={fields.badge}
              tone={wrong.badge ? "bad" : "rest"}
              autoComplete="off"
              onValueChange={set("badge")}
              aria-describedby={wrong.badge ? "invite-badge-message" : undefined}
            />
          </Labelled>
          <Labelled id="invite-name" label="Printed name" error={wrong.printedName}>
            <TextField
              id="invite-name"
              value={fields.printedName}
              maxLength={80}
              tone={wrong.printedName ? "bad" : "rest"}
              autoComplete="off"
              onValueChange={set("printedName")}
              aria-describedby={wrong.printedName ? "invite-name-message" : undefined}
            />
          </Labelled>
          <Labelled id="invite-role" label="Role">
            <ChoiceField
              id="invite-role"
              value={role}
              options={roles.map((one) => ({ value: one, label: roleWords[one] }))}
              onValueChange={(value) => setRole(value as Role)}
            />
          </Labelled>
          {takesFacilities && facilities.length > 0 && (
            <fieldset className="mt-3.5">
              <legend className="font-medium">Facilities</legend>
              {facilities.map(({ id, name }) => (
                <label
                  key={id}
                  htmlFor={`invite-${id}`}
                  className="flex min-h-[34px] cursor-pointer items-center gap-2.5 phone:min-h-[44px]"
                >
                  <CheckBox
                    id={`invite-${id}`}
                    checked={facilityIds.includes(id)}
                    onChange={(on) => setFacilityIds((before) => (on ? [...before, id] : before.filter((one) => one !== id)))}
                  />
                  {name}
                </label>
              ))}
            </fieldset>
          )}
          <Labelled
            id="invite-password"
            label="First password"
            hint="15 characters or more; must be changed at the first sign-in"
            error={wrong.firstPassword}
          >
            <PasswordField
              id="invite-password"
              autoComplete="new-password"
              value={fields.firstPassword}
              onValueChange={set("firstPassword")}
              bad={Boolean(wrong.firstPassword)}
              aria-describedby="invite-password-message"
            />
          </Labelled>
        </form>
        {invite.isError && Object.keys(wrong).length === 0 && (
          <div className="mt-3">
            <Notice tone="error">{wordsOf(invite.error)}</Notice>
          </div>
        )}
      </Dialog>
    </>
  );
}
