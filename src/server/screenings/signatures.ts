import "server-only";
import { and, asc, eq, inArray } from "drizzle-orm";
import { z } from "zod";
import type { Transaction } from "@db/clients";
import { body, entry } from "@db/schema/ledger/entry";
import { roles } from "@/contracts/roles";
import type { RemarkView, SignatureView } from "@/contracts/views";

const actOfKind = {
  screening_signed: "signed",
  screening_countersigned: "countersigned",
  screening_returned: "returned",
  screening_withdrawn: "withdrawn",
} as const;
type SignatureKind = keyof typeof actOfKind;

/** The part of a statement that sheets show; what else it holds stays where it is. */
const statementSchema = z.object({
  meaning: z.string(),
  person: z.object({ badge: z.string(), printedName: z.string(), role: z.enum(roles) }),
  conditions: z.array(z.string()).default([]),
  remarks: z.array(z.object({ line: z.string(), text: z.string() })).default([]),
  reason: z.string().optional(),
  authentication: z.object({ method: z.string() }),
  factor: z.string().optional(),
});

/** Every signature under one revision, oldest first, in the words of its own entry. */
export async function listSignatures(transaction: Transaction, screeningId: string, rev: number): Promise<SignatureView[]> {
  const rows = await transaction
    .select({ seq: entry.seq, at: entry.at, kind: entry.kind, hash: entry.hash, bytes: body.bytes })
    .from(entry)
    .innerJoin(body, eq(body.seq, entry.seq))
    .where(
      and(
        eq(entry.subjectId, screeningId),
        eq(entry.subject, `screening:${screeningId}:${rev}`),
        inArray(entry.kind, Object.keys(actOfKind)),
      ),
    )
    .orderBy(asc(entry.seq));
  return rows.flatMap(({ seq, at, kind, hash, bytes }) => {
    if (bytes === null) return [];
    const statement = statementSchema.parse(JSON.parse(bytes));
    return [
      {
        act: actOfKind[kind as SignatureKind],
        seq,
        at,
        ...statement.person,
        meaning: statement.meaning,
        method: statement.factor ?? statement.authentication.method,
        hash: hash.toString("hex"),
        conditions: statement.conditions,
        remarks: statement.remarks.map((remark) => ({ ...remark, by: statement.person.badge, at })),
      },
    ];
  });
}

/** Remarks of the return that a later revision answers. */
export async function remarksOf(transaction: Transaction, screeningId: string, rev: number | null): Promise<RemarkView[]> {
  if (rev === null) return [];
  return (await listSignatures(transaction, screeningId, rev)).flatMap(({ remarks }) => remarks);
}
