"use client";

import { Button } from "@/components/button/button";
import { TextArea } from "@/components/line/text-area";

type Props = { conditions: readonly string[]; onChange: (conditions: string[]) => void; disabled: boolean };

/** What has to be done for the countersign to hold; stands on the record in these words. */
export function ConditionsEditor({ conditions, onChange, disabled }: Props) {
  return (
    <section aria-label="Conditions" className="mt-[18px]">
      <h3 className="mb-1.5">
        Conditions <span className="font-normal text-ink-3">{conditions.length === 0 && "none"}</span>
      </h3>
      {conditions.map((text, index) => (
        <div key={index} className="border-t border-rule-2 py-2">
          <TextArea
            label={`Condition ${index + 1}`}
            value={text}
            maxLength={600}
            disabled={disabled}
            onValueChange={(value) => onChange(conditions.map((one, at) => (at === index ? value : one)))}
          />
          <Button
            kind="quiet"
            aria-label={`Remove condition ${index + 1}`}
            onClick={() => onChange(conditions.filter((_, at) => at !== index))}
          >
            Remove
          </Button>
        </div>
      ))}
      <Button kind="quiet" onClick={() => onChange([...conditions, ""])}>
        Add a condition
      </Button>
    </section>
  );
}
