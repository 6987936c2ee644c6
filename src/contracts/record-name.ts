/** "SC-0001": how a screening's number is written everywhere; five digits and more simply grow. */
export const recordName = (number: number): string => `SC-${String(number).padStart(4, "0")}`;

/** The number in "SC-0041", "sc 41" or "41"; undefined where there is none. */
export function recordNumber(text: string): number | undefined {
  const match = /^(?:sc[-\s]?)?0*(\d{1,9})$/i.exec(text.trim());
  const number = match ? Number(match[1]) : 0;
  return number >= 1 ? number : undefined;
}
