"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useId, useState, type FormEvent } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { Dialog } from "@/components/dialog/dialog";
import { ChoiceField } from "@/components/line/choice-field";
import { Labelled } from "@/components/line/labelled";
import { TextArea } from "@/components/line/text-area";
import { TextField } from "@/components/line/text-field";
import { endpoints, pages } from "@/contracts/paths";
import { createSectionSchema, type CreateSection } from "@/contracts/requests";
import type { SectionView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";
import { isRefused, wordsOf } from "@/features/query/refused-error";

type Props = { facilities: readonly { id: string; code: string; name: string }[] };

/** Adds an isolatable section to one of the engineer's facilities, then opens it. */
export function NewSectionButton({ facilities }: Props) {
  const router = useRouter();
  const form = useId();
  const [open, setOpen] = useState(false);
  const [fields, setFields] = useState({ facilityId: facilities[0]?.id ?? "", tag: "", name: "", description: "" });
  const [wrong, setWrong] = useState<Partial<Record<"tag" | "name", string>>>({});
  const set = (name: keyof typeof fields) => (value: string) => setFields((before) => ({ ...before, [name]: value }));
  const create = useMutation({
    mutationFn: (body: CreateSection) => postJson<SectionView>(endpoints.sections, body),
    onSuccess: ({ id }) => router.push(pages.section(id)),
  });
  const refused = isRefused(create.error) ? create.error : null;
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const found = {
      ...(fields.tag.trim() === "" ? { tag: "Give the tag of the section, such as IS-21." } : {}),
      ...(fields.name.trim() === "" ? { name: "Give the section a name." } : {}),
    };
    setWrong(found);
    const parsed = createSectionSchema.safeParse(fields);
    if (Object.keys(found).length === 0 && parsed.success) create.mutate(parsed.data);
  };
  const tagWrong = wrong.tag ?? refused?.problemAt("tag");

  return (
    <>
      <Button
        waitsFor={facilities.length === 0 && "You belong to no facility yet. An administrator can add you."}
        onClick={() => setOpen(true)}
      >
        New section
      </Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title="New section"
        actions={
          <>
            <Button kind="main" type="submit" form={form} busy={create.isPending}>
              Add the section
            </Button>
            <Button kind="quiet" onClick={() => setOpen(false)}>
              Not now
            </Button>
          </>
        }
      >
        <p className="font-serif text-prose text-ink-2">
          A section is what closed valves hold in: one inventory that vents as one.
        </p>
        <form id={form} onSubmit={submit} noValidate>
          {facilities.length > 1 && (
            <Labelled id="section-facility" label="Facility">
              <ChoiceField
                id="section-facility"
                value={fields.facilityId}
                options={facilities.map(({ id, name }) => ({ value: id, label: name }))}
                onValueChange={set("facilityId")}
              />
            </Labelled>
          )}
          <Labelled id="section-tag" label="Tag" error={tagWrong}>
            <TextField
              id="section-tag"
              value={fields.tag}
              maxLength={20}
              tone={tagWrong ? "bad" : "rest"}
              onValueChange={set("tag")}
              aria-describedby={tagWrong ? "section-tag-message" : undefined}
            />
          </Labelled>
          <Labelled id="section-name" label="Name" error={wrong.name}>
            <TextField
              id="section-name"
              value={fields.name}
              maxLength={80}
              tone={wrong.name ? "bad" : "rest"}
              onValueChange={set("name")}
              aria-describedby={wrong.name ? "section-name-message" : undefined}
            />
          </Labelled>
          <Labelled id="section-description" label="What it holds" hint="Vessels and the valves that close it; may stay empty.">
            <TextArea
              id="section-description"
              value={fields.description}
              maxLength={600}
              onValueChange={set("description")}
              aria-describedby="section-description-message"
            />
          </Labelled>
        </form>
        {create.isError && !refused?.problemAt("tag") && (
          <div className="mt-3">
            <Notice tone="error">{wordsOf(create.error)}</Notice>
          </div>
        )}
      </Dialog>
    </>
  );
}
