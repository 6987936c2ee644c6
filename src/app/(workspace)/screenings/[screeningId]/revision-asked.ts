import { notFound } from "next/navigation";
import { revisionQuerySchema } from "@/contracts/requests";

/** The revision named in the address; undefined for the newest. What is no revision is not there. */
export function revisionAsked(rev: string | string[] | undefined): number | undefined {
  if (rev === undefined) return undefined;
  const parsed = revisionQuerySchema.safeParse({ rev });
  return parsed.success ? parsed.data.rev : notFound();
}
