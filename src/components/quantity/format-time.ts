/** Times as people read them. Records and the log are in UTC and say so; the reader's own clock is for "Kept" only. */

const months = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];
const two = (value: number): string => String(value).padStart(2, "0");

/** "1 Dec 15:58:37", UTC; with the year when it is not that of `now`. */
export function formatUtc(iso: string, now?: string): string {
  const at = new Date(iso);
  if (Number.isNaN(at.getTime())) return "–";
  const year = now && new Date(now).getUTCFullYear() === at.getUTCFullYear() ? "" : ` ${at.getUTCFullYear()}`;
  return `${at.getUTCDate()} ${months[at.getUTCMonth()]}${year} ${two(at.getUTCHours())}:${two(at.getUTCMinutes())}:${two(at.getUTCSeconds())}`;
}

/** "2026-12-01 15:40:12.481 UTC": to the millisecond, as an entry holds it. */
export function formatUtcExact(iso: string): string {
  const at = new Date(iso);
  return Number.isNaN(at.getTime()) ? "–" : `${at.toISOString().replace("T", " ").replace("Z", "")} UTC`;
}

/** "14:32:08" on the reader's own clock. For client components: the server's clock would say another. */
export const formatClock = (at: Date, seconds = true): string =>
  `${two(at.getHours())}:${two(at.getMinutes())}${seconds ? `:${two(at.getSeconds())}` : ""}`;
