"use client";

import { useId } from "react";
import { CheckBox } from "./check-box";
import type { Caution } from "./caution-block";

type Props = {
  items: readonly Caution[];
  /** Ids acknowledged so far. */
  acknowledged: ReadonlySet<string>;
  onToggle: (id: string, acknowledged: boolean) => void;
  /** Names the list ("Cautions you acknowledge"). */
  label: string;
  disabled?: boolean;
};

/** Cautions acknowledged one by one. There is no "all of them": each is read. */
export function AckList({ items, acknowledged, onToggle, label, disabled }: Props) {
  const name = useId();
  return (
    <ul aria-label={label}>
      {items.map(({ id, words }) => (
        <li key={id} className="border-b">
          <label
            htmlFor={`${name}-${id}`}
            className="grid min-h-[44px] cursor-pointer grid-cols-[30px_1fr] items-start gap-x-2.5 py-3 font-serif text-prose phone:grid-cols-[44px_1fr]"
          >
            <CheckBox
              id={`${name}-${id}`}
              checked={acknowledged.has(id)}
              disabled={disabled}
              onChange={(checked) => onToggle(id, checked)}
            />
            <span>
              <b className="mr-1.5 font-num text-small leading-none text-near">{id}</b> {words}
            </span>
          </label>
        </li>
      ))}
    </ul>
  );
}
