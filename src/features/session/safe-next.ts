import { pages } from "@/contracts/paths";

/** An address of this site to go on to; the desk for anything that could lead elsewhere ("//host", "/\host", "https:"). */
export function safeNext(next: string | undefined): string {
  if (!next?.startsWith("/")) return pages.desk;
  const here = "http://here.invalid";
  try {
    const url = new URL(next, here);
    return url.origin === here && url.pathname !== pages.signIn ? url.pathname + url.search + url.hash : pages.desk;
  } catch {
    return pages.desk;
  }
}
