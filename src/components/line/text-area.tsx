"use client";

import type { ComponentPropsWithRef } from "react";

type Props = Omit<ComponentPropsWithRef<"textarea">, "className" | "style" | "value" | "onChange"> & {
  value: string;
  onValueChange: (text: string) => void;
  label?: string;
};

/** Several lines of words: remarks, reasons. Set in serif, because it says something. */
export function TextArea({ value, onValueChange, label, ...rest }: Props) {
  return (
    <textarea
      {...rest}
      aria-label={label}
      value={value}
      onChange={(event) => onValueChange(event.target.value)}
      className="block min-h-[84px] w-full rounded border border-b-2 border-rule-2 !border-b-rule-3 bg-field px-2.5 py-2 font-serif text-prose leading-[1.4] text-ink"
    />
  );
}
