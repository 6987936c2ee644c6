"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { Labelled } from "@/components/line/labelled";
import { PasswordField } from "@/components/line/password-field";
import { endpoints } from "@/contracts/paths";
import { changePasswordSchema, type ChangePassword } from "@/contracts/requests";
import { postJson } from "@/features/query/fetch-json";
import { isRefused, wordsOf } from "@/features/query/refused-error";

type Wrong = Partial<Record<"current" | "next" | "again", string>>;

/**
 * The password in use, and a new one twice.
 *
 * onChanged   told once the server has it; the caller says what follows
 */
export function ChangePasswordForm({ onChanged }: { onChanged: () => void }) {
  const [fields, setFields] = useState({ current: "", next: "", again: "" });
  const [wrong, setWrong] = useState<Wrong>({});
  const set = (name: keyof typeof fields) => (value: string) => setFields((before) => ({ ...before, [name]: value }));

  const change = useMutation({
    mutationFn: (body: ChangePassword) => postJson<undefined>(endpoints.password, body),
    onSuccess: () => {
      setFields({ current: "", next: "", again: "" });
      onChanged();
    },
    onError: (error) => {
      if (isRefused(error, "wrong-credentials")) setWrong({ current: "This is not the password in use. Nothing was changed." });
      else if (isRefused(error, "invalid-request")) setWrong({ next: error.problemAt("next") ?? wordsOf(error) });
    },
  });
  const said = isRefused(change.error, "wrong-credentials") || isRefused(change.error, "invalid-request");

  const submit = (event: FormEvent) => {
    event.preventDefault();
    const { current, next, again } = fields;
    const found: Wrong = {};
    if (current === "") found.current = "Type the password you signed in with.";
    if (next.length < 15) found.next = "Use 15 characters or more. A few words in a row are easy to keep in mind.";
    else if (again !== next) found.again = "The two do not agree. Type the new password again.";
    setWrong(found);
    const parsed = changePasswordSchema.safeParse({ current, next });
    if (Object.keys(found).length === 0 && parsed.success) change.mutate(parsed.data);
  };

  return (
    <form onSubmit={submit} noValidate aria-label="Change password" className="max-w-[420px]">
      {change.isError && !said && (
        <div className="mt-3">
          <Notice tone="error">{wordsOf(change.error)}</Notice>
        </div>
      )}
      <Labelled id="current" label="Password in use" error={wrong.current}>
        <PasswordField
          id="current"
          value={fields.current}
          onValueChange={set("current")}
          bad={Boolean(wrong.current)}
          aria-describedby="current-message"
        />
      </Labelled>
      <Labelled id="next" label="New password" hint="15 characters or more" error={wrong.next}>
        <PasswordField
          id="next"
          autoComplete="new-password"
          value={fields.next}
          onValueChange={set("next")}
          bad={Boolean(wrong.next)}
          aria-describedby="next-message"
        />
      </Labelled>
      <Labelled id="again" label="New password, once more" error={wrong.again}>
        <PasswordField
          id="again"
          autoComplete="new-password"
          value={fields.again}
          onValueChange={set("again")}
          bad={Boolean(wrong.again)}
          aria-describedby="again-message"
        />
      </Labelled>
      <div className="mt-5">
        <Button kind="main" type="submit" busy={change.isPending}>
          Change password
        </Button>
      </div>
    </form>
  );
}
