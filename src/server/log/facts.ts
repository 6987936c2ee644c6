import "server-only";
import { z } from "zod";
import type { EntryView } from "@/contracts/views";

/** Words for the members of a body that a reader of the log looks for first. What is not here is in the body itself. */
const labels: Record<string, string> = {
  meaning: "Meaning",
  factor: "Method",
  sentence: "Result",
  verdict: "Verdict",
  engineVersion: "Engine",
  reason: "Reason",
  badge: "Badge",
  printedName: "Printed name",
  role: "Role",
  from: "Role before",
  twoPersonRule: "Rule of two administrators",
  facility: "Facility",
  origin: "Origin",
  act: "Act",
  until: "Until",
};

const bodySchema = z.looseObject({
  person: z.object({ badge: z.string(), printedName: z.string(), role: z.string() }).optional(),
  content: z.object({ sha256: z.string() }).optional(),
  replaces: z.object({ rev: z.number(), reason: z.string() }).nullish(),
  conditions: z.array(z.string()).optional(),
  remarks: z.array(z.object({ line: z.string(), text: z.string() })).optional(),
  cautions: z.array(z.object({ id: z.string(), words: z.string() })).optional(),
});

/** What an entry says, as rows of label and value. Empty where the body may not be read. */
export function factsOf(body: string | null): EntryView["facts"] {
  if (body === null) return [];
  const parsed = bodySchema.safeParse(JSON.parse(body));
  if (!parsed.success) return [];
  const { person, content, replaces, conditions = [], remarks = [], cautions = [] } = parsed.data;
  const facts: EntryView["facts"] = [];
  if (person) facts.push({ label: "Printed name", value: `${person.printedName}, ${person.badge}, ${person.role}` });
  for (const [key, label] of Object.entries(labels)) {
    const value = (parsed.data as Record<string, unknown>)[key];
    if (typeof value === "string" && !(person && key === "act")) facts.push({ label, value });
  }
  if (replaces) facts.push({ label: "Replaces", value: `Rev ${replaces.rev}: ${replaces.reason}` });
  conditions.forEach((text, at) => facts.push({ label: `Condition ${at + 1}`, value: text }));
  for (const { line, text } of remarks) facts.push({ label: `Remark on ${line}`, value: text });
  if (cautions.length > 0) facts.push({ label: "Cautions acknowledged", value: cautions.map(({ id }) => id).join(", ") });
  if (content) facts.push({ label: "Content", value: content.sha256 });
  return facts;
}
