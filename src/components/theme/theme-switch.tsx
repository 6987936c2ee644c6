"use client";

import { useState } from "react";
import { keepInCookie } from "../cookie";
import { radioLook } from "../line/radio-look";
import { showTheme, themeCookie, themes, type Theme } from "./theme";

const words: Record<Theme, string> = { light: "Light", dark: "Dark", system: "As the system" };

/** Radios for the sheet: light, dark, or as the system says. Takes effect at once; the cookie holds it for the next page. */
export function ThemeSwitch({ initial, onChange }: { initial: Theme; onChange?: (theme: Theme) => void }) {
  const [theme, setTheme] = useState(initial);

  const choose = (chosen: Theme) => {
    setTheme(chosen);
    keepInCookie(themeCookie, chosen);
    showTheme(chosen);
    onChange?.(chosen);
  };

  return (
    <fieldset>
      <legend className="text-label font-medium text-ink-3">Sheet</legend>
      {themes.map((option) => (
        <label key={option} className="flex min-h-[34px] cursor-pointer items-center gap-2 phone:min-h-[44px]">
          <input type="radio" name="theme" className={radioLook} checked={theme === option} onChange={() => choose(option)} />
          {words[option]}
        </label>
      ))}
    </fieldset>
  );
}
