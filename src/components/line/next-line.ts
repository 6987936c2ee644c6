/** Marks a control as the value of a line, for moving down the form with Enter. */
export const lineValueMark = { "data-line-value": "" } as const;

/**
 * Moves to the value of the next line, as Enter does. At the last line the focus stays where it is, and the answer is false.
 *
 * from   the control that has the focus
 */
export function focusNextLine(from: HTMLElement): boolean {
  const values = [...document.querySelectorAll<HTMLElement>("[data-line-value]")];
  const next = values[values.indexOf(from) + 1];
  if (!next) return false;
  next.focus();
  if (next instanceof HTMLInputElement && next.type !== "radio") next.select();
  return true;
}

/** Goes to the line with this number ("4.03"). Says whether there is one on the page. */
export function focusLine(no: string): boolean {
  const value = document.getElementById(`value-${no}`) ?? document.getElementById(`line-${no}`);
  if (!value) return false;
  value.scrollIntoView({ block: "center" });
  value.focus();
  return true;
}
