"use client";

import { Formik } from "formik";
import { useRouter } from "next/navigation";
import { useState } from "react";
import * as yup from "yup";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { ChoiceField } from "@/components/line/choice-field";
import { Labelled } from "@/components/line/labelled";
import { TextField } from "@/components/line/text-field";
import { ButtonRow, PageHead } from "@/components/shell/page-head";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { Stop } from "@/components/states/stop";
import { endpoints, pages } from "@/contracts/paths";
import type { SectionView } from "@/contracts/views";
import { postJson } from "@/features/query/fetch-json";
import { wordsOf } from "@/features/query/refused-error";

const newSection = "new";

type Start = { section: string; title: string; facility: string; tag: string; name: string };

const schema = yup.object({
  section: yup.string().required("Choose the section, or describe a new one."),
  title: yup
    .string()
    .trim()
    .required("Give the screening a title, for example “Cold blowdown from settle-out”.")
    .max(120, "At most 120 characters fit."),
  facility: yup
    .string()
    .when("section", { is: newSection, then: (s) => s.required("Choose the facility that the section belongs to.") }),
  tag: yup
    .string()
    .trim()
    .when("section", {
      is: newSection,
      then: (s) => s.required("Give the section its tag, for example IS-21.").max(20, "At most 20 characters fit."),
    }),
  name: yup
    .string()
    .trim()
    .when("section", {
      is: newSection,
      then: (s) => s.required("Say what the section is, for example “Inlet separation”.").max(80, "At most 80 characters fit."),
    }),
});

/** Starts a screening of a section, or of a section described here and now. The number is given when the draft is made. */
export function StartScreening({
  sections,
  facilities,
  chosen,
  mayStart,
}: {
  sections: SectionView[];
  facilities: { id: string; name: string }[];
  chosen: string;
  mayStart: boolean;
}) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);

  async function start({ section, title, facility, tag, name }: Start) {
    setProblem(null);
    try {
      const sectionId =
        section === newSection
          ? (
              await postJson<SectionView>(endpoints.sections, {
                facilityId: facility,
                tag: tag.trim(),
                name: name.trim(),
                description: "",
              })
            ).id
          : section;
      const made = await postJson<{ id: string }>(endpoints.screenings, { sectionId, title: title.trim() });
      router.push(pages.part(made.id, "scope"));
    } catch (error) {
      setProblem(wordsOf(error));
    }
  }

  return (
    <Sheet>
      <SheetBody>
        <PageHead title="New screening" />
        {!mayStart ? (
          <Stop title="Engineers start screenings">
            Your role reads and decides on them. Ask an engineer of the facility to start one.
          </Stop>
        ) : facilities.length === 0 ? (
          <Stop title="You belong to no facility yet">An administrator adds you to one; then its sections stand here.</Stop>
        ) : (
          <Formik<Start>
            initialValues={{
              section: sections.some(({ id }) => id === chosen) ? chosen : sections.length === 0 ? newSection : "",
              title: "",
              facility: facilities.length === 1 ? (facilities[0]?.id ?? "") : "",
              tag: "",
              name: "",
            }}
            validationSchema={schema}
            onSubmit={start}
          >
            {({ values, errors, touched, submitCount, setFieldValue, setFieldTouched, handleSubmit, isSubmitting }) => {
              const field = (name: keyof Start) => ({
                id: `start-${name}`,
                value: values[name],
                onValueChange: (value: string) => void setFieldValue(name, value),
                tone: shownError(name) ? ("bad" as const) : ("rest" as const),
              });
              const shownError = (name: keyof Start) => (touched[name] || submitCount > 0 ? errors[name] : undefined);
              return (
                <form noValidate onSubmit={handleSubmit} className="max-w-[560px]">
                  {problem && (
                    <Notice tone="error" title="Not started.">
                      {problem}
                    </Notice>
                  )}
                  <Labelled
                    id="start-section"
                    label="Section"
                    hint="The isolatable section: what closed valves hold in."
                    error={shownError("section")}
                  >
                    <ChoiceField
                      {...field("section")}
                      prompt="Choose"
                      options={[
                        ...sections.map(({ id, tag, name, facility }) => ({
                          value: id,
                          label: `${tag} ${name}, ${facility.name}`,
                        })),
                        { value: newSection, label: "A new section" },
                      ]}
                    />
                  </Labelled>
                  {values.section === newSection && (
                    <>
                      <Labelled id="start-facility" label="Facility" error={shownError("facility")}>
                        <ChoiceField
                          {...field("facility")}
                          prompt="Choose"
                          options={facilities.map(({ id, name }) => ({ value: id, label: name }))}
                        />
                      </Labelled>
                      <Labelled id="start-tag" label="Tag of the section" error={shownError("tag")}>
                        <TextField {...field("tag")} onLeave={() => void setFieldTouched("tag")} maxLength={20} />
                      </Labelled>
                      <Labelled id="start-name" label="What it is" error={shownError("name")}>
                        <TextField {...field("name")} onLeave={() => void setFieldTouched("name")} maxLength={80} />
                      </Labelled>
                    </>
                  )}
                  <Labelled id="start-title" label="Title on the sheet" error={shownError("title")}>
                    <TextField {...field("title")} onLeave={() => void setFieldTouched("title")} maxLength={120} />
                  </Labelled>
                  <ButtonRow>
                    <Button kind="main" type="submit" busy={isSubmitting}>
                      Start the screening
                    </Button>
                  </ButtonRow>
                </form>
              );
            }}
          </Formik>
        )}
      </SheetBody>
    </Sheet>
  );
}
