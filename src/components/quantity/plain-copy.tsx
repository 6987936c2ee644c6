"use client";

import { useEffect } from "react";
import { plainText } from "./format";

/** Makes what is copied from the page plain: a hyphen-minus, no narrow spaces, so that a figure pasted into a spreadsheet is a number. */
export function PlainCopy() {
  useEffect(() => {
    const copyPlain = (event: ClipboardEvent) => {
      // A field gives its own selection, which the document does not see; it is left as it is.
      const selected = document.getSelection()?.toString() ?? "";
      const plain = plainText(selected);
      if (plain === selected || !event.clipboardData) return;
      event.clipboardData.setData("text/plain", plain);
      event.preventDefault();
    };
    document.addEventListener("copy", copyPlain);
    return () => document.removeEventListener("copy", copyPlain);
  }, []);
  return null;
}
