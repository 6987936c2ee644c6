import "server-only";
import { eq } from "drizzle-orm";
import { randomUUID } from "node:crypto";
import { facility } from "@db/schema/app/facility";
import { person } from "@db/schema/ledger/person";
import type { ChangeMembers, CreateFacility } from "@/contracts/requests";
import type { FacilityView } from "@/contracts/views";
import { subjectOf } from "@/ledger/entry-kinds";
import { authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { readDatabase, signDatabase } from "@/server/database";
import { alreadyExists } from "@/server/database-refusal";
import { recordEvent } from "@/server/ledger/write";
import { isId, writing } from "@/server/reading";
import { Refusal } from "@/server/refusal";
import { getFacility } from "./read";

/** Adds a facility with its first limit policy, which becomes an entry. Nobody belongs to it yet. */
export async function createFacility(
  viewer: Viewer,
  input: CreateFacility,
  options: { demo?: true } = {},
): Promise<FacilityView> {
  authorise(viewer, "facility.create");
  const [made] = await writing(viewer, (transaction) =>
    transaction
      .insert(facility)
      .values({ ...input, demo: options.demo ?? false, createdBy: viewer.id })
      .returning({ id: facility.id }),
  ).catch(
    alreadyExists("facility_code_unique", "code", `There is a facility with code ${input.code} already. Choose another code.`),
  );
  if (!made) throw new Error("the facility was not stored");
  await recordEvent(signDatabase(), {
    actor: viewer.id,
    kind: "policy_changed",
    subject: subjectOf.facility(made.id),
    idempotencyKey: `policy-${made.id}-1`,
    body: { facility: input.code, from: null, to: { ...input.policy }, reason: "First limit policy of the facility." },
  });
  return viewOf(viewer, made.id);
}

/** Adds a person to a facility, or takes one out. Each is an entry. */
export async function changeMembers(viewer: Viewer, facilityId: string, { act, personId }: ChangeMembers): Promise<FacilityView> {
  authorise(viewer, "member.change", { personId });
  if (!isId(facilityId)) throw new Refusal("not-found");
  const [[place], [who]] = await Promise.all([
    readDatabase().select({ code: facility.code }).from(facility).where(eq(facility.id, facilityId)),
    readDatabase().select({ badge: person.badge }).from(person).where(eq(person.id, personId)),
  ]);
  if (!place || !who) throw new Refusal("not-found");
  await recordEvent(signDatabase(), {
    actor: viewer.id,
    kind: act === "add" ? "member_added" : "member_removed",
    subject: subjectOf.member(facilityId, personId),
    idempotencyKey: randomUUID(),
    body: { badge: who.badge, facility: place.code },
  });
  return viewOf(viewer, facilityId);
}

async function viewOf(viewer: Viewer, facilityId: string): Promise<FacilityView> {
  const view = await getFacility(viewer, facilityId);
  if (!view) throw new Refusal("not-found");
  return view;
}
