"use client";

import { useState, type ComponentPropsWithRef } from "react";

type Props = Omit<ComponentPropsWithRef<"input">, "className" | "style" | "value" | "onChange" | "type"> & {
  value: string;
  onValueChange: (password: string) => void;
  /** Draws the box as wrong; the words stand in the message that `aria-describedby` points at. */
  bad?: boolean;
};

/** A password with a button that shows what was typed. Give it an `id` and a `<label htmlFor>`. */
export function PasswordField({ value, onValueChange, bad, autoComplete = "current-password", ...rest }: Props) {
  const [shown, setShown] = useState(false);

  return (
    <div className={`field-box !h-[46px] ${bad ? "bad" : ""}`}>
      <input
        {...rest}
        type={shown ? "text" : "password"}
        autoComplete={autoComplete}
        autoCapitalize="none"
        spellCheck={false}
        className="field-value words"
        aria-invalid={bad || undefined}
        value={value}
        onChange={(event) => onValueChange(event.target.value)}
      />
      <button
        type="button"
        aria-pressed={shown}
        aria-label="Show password"
        onClick={() => setShown(!shown)}
        className="min-w-[64px] border-l px-2 text-note text-tide phone:min-w-[60px]"
      >
        {shown ? "Hide" : "Show"}
      </button>
    </div>
  );
}
