"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useId, useState, type FormEvent } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { Dialog } from "@/components/dialog/dialog";
import { Labelled } from "@/components/line/labelled";
import { TextField } from "@/components/line/text-field";
import { endpoints, pages } from "@/contracts/paths";
import type { CreateFacility } from "@/contracts/requests";
import type { FacilityView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";
import { isRefused, wordsOf } from "@/features/query/refused-error";
import {
  emptyFacility,
  figureFields,
  readFacility,
  type FacilityForm,
  type FacilityProblems,
  type FigureField,
} from "./read-policy";

/** Adds a facility with its first limit policy, which becomes a log entry; then opens it, to add members. */
export function NewFacilityButton() {
  const router = useRouter();
  const formId = useId();
  const [open, setOpen] = useState(false);
  const [form, setForm] = useState<FacilityForm>(emptyFacility);
  const [problems, setProblems] = useState<FacilityProblems>({});
  const create = useMutation({
    mutationFn: (body: CreateFacility) => postJson<FacilityView>(endpoints.facilities, body),
    onSuccess: ({ id }) => router.push(pages.facility(id)),
    onError: (error) => {
      const code = isRefused(error) ? error.problemAt("code") : undefined;
      if (code) setProblems({ code });
    },
  });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const read = readFacility(form);
    setProblems("problems" in read ? read.problems : {});
    if ("facility" in read) create.mutate(read.facility);
  };
  const field = (name: keyof FacilityForm, label: string, hint?: string, maxLength = 40) => (
    <Labelled key={name} id={`facility-${name}`} label={label} hint={hint} error={problems[name]}>
      <TextField
        id={`facility-${name}`}
        value={form[name]}
        maxLength={maxLength}
        tone={problems[name] ? "bad" : "rest"}
        onValueChange={(value) => setForm((before) => ({ ...before, [name]: value }))}
        aria-describedby={problems[name] || hint ? `facility-${name}-message` : undefined}
      />
    </Labelled>
  );

  return (
    <>
      <Button kind="main" onClick={() => setOpen(true)}>
        New facility
      </Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title="New facility"
        actions={
          <>
            <Button kind="main" type="submit" form={formId} busy={create.isPending}>
              Add the facility
            </Button>
            <Button kind="quiet" onClick={() => setOpen(false)}>
              Not now
            </Button>
          </>
        }
      >
        <form id={formId} onSubmit={submit} noValidate>
          {field("name", "Name", undefined, 80)}
          {field("code", "Code", "2 to 8 letters or digits, never changed", 8)}
          {(Object.keys(figureFields) as FigureField[]).slice(0, 1).map((name) => field(name, ...figureWords(name)))}
          <h3 className="mt-5">Limit policy, becomes a log entry</h3>
          {field("policyName", "Name of the policy")}
          {(Object.keys(figureFields) as FigureField[]).slice(1).map((name) => field(name, ...figureWords(name)))}
        </form>
        {create.isError && !problems.code && (
          <div className="mt-3">
            <Notice tone="error">{wordsOf(create.error)}</Notice>
          </div>
        )}
      </Dialog>
    </>
  );
}

function figureWords(name: FigureField): [label: string, hint: string] {
  const { label, unit, hint } = figureFields[name];
  return [label, `in ${unit}, or with another unit. ${hint ?? ""}`.trim()];
}
