"use client";

import { useRouter } from "next/navigation";
import { useEffect } from "react";
import { LineJump } from "@/components/line/line-jump";
import { focusLine } from "@/components/line/next-line";
import { askedKeys, askedKeysOf } from "@/contracts/draft";
import { useDraft } from "./draft-context";
import { lineAddress } from "./line-address";

/** Keys of the form: "/" goes to a line by its number, Alt+S opens the source of the line in hand. Named at the foot of the form. */
export function FormKeys() {
  const { draft, letter, subject } = useDraft();
  const router = useRouter();

  useEffect(() => {
    const openSource = (event: KeyboardEvent) => {
      if (!event.altKey || event.code !== "KeyS" || !(event.target instanceof HTMLElement)) return;
      const opener = event.target.closest("[id^='line-']")?.querySelector<HTMLButtonElement>("[data-source-of] button");
      if (!opener) return;
      event.preventDefault();
      opener.click();
    };
    window.addEventListener("keydown", openSource);
    return () => window.removeEventListener("keydown", openSource);
  }, []);

  // A line named in the address takes the focus once its part is drawn.
  useEffect(() => {
    const key = /^#line-(.+)$/.exec(window.location.hash)?.[1];
    if (key) focusLine(decodeURIComponent(key));
  }, []);

  /** "4.03", "A5.02" or "5.02", "2.04-1" or "2.04": the letter and the item may be left out. */
  const jump = (no: string): boolean => {
    // The case in hand first, so that "5.02" is its own line.
    const found = [...askedKeysOf(draft, letter), ...askedKeys(draft)].find(({ key }) =>
      [key, key.replace(/^[A-Z]/, ""), key.replace(/-\d+$/, "")].includes(no),
    );
    if (!found) return false;
    if (!focusLine(found.key)) router.push(lineAddress(subject.screeningId, found.key));
    return true;
  };

  return (
    <>
      <p className="flex flex-wrap gap-x-5 gap-y-1 pt-4 text-small text-ink-3 print:hidden phone:hidden">
        <span>
          <kbd>Enter</kbd> next line
        </span>
        <span>
          <kbd>/</kbd> go to a line number
        </span>
        <span>
          type <kbd>1 in</kbd> to convert
        </span>
        <span>
          <kbd>Alt</kbd> <kbd>S</kbd> source
        </span>
        <span>paste a column to fill downwards</span>
      </p>
      <LineJump onJump={jump} />
    </>
  );
}
