/** How a screening's number is shown: SC-0001. The database composes it the same way. */
export const recordName = (number: number): string => `SC-${String(number).padStart(4, "0")}`;

/** The number in "SC-0412", "sc-412" or "412"; undefined for anything else. */
export function recordNumber(text: string): number | undefined {
  const digits = /^(?:SC-)?0*([1-9][0-9]{0,8})$/i.exec(text.trim())?.[1];
  return digits === undefined ? undefined : Number(digits);
}
