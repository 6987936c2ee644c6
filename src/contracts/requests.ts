/** What each changing request carries. Unknown keys are refused. */
import { z } from "zod";
import { draftDocumentSchema } from "./draft";
import { limitPolicySchema } from "./policy";
import { roles } from "./roles";
import { revisionStates } from "./views";

const id = z.uuid();
const text = (max: number) => z.string().trim().min(1).max(max).normalize("NFC");
/** Made when a signing page opens and kept for its retries, so that a repeat is the same act. */
const idempotencyKey = z.string().regex(/^[A-Za-z0-9_-]{16,64}$/);
const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
const password = z.string().min(1).max(128);
const newPassword = z.string().min(15, "use 15 characters or more").max(128);

export const badgeSchema = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z]{1,3}-\d{1,5}$/, "a badge looks like E-114");

export const signInSchema = z.strictObject({ badge: badgeSchema, password });
export const changePasswordSchema = z.strictObject({ current: password, next: newPassword });
export const preferencesSchema = z.strictObject({
  units: z.enum(["SI", "US"]).optional(),
  theme: z.enum(["light", "dark", "system"]).optional(),
});

export const invitePersonSchema = z.strictObject({
  badge: badgeSchema,
  printedName: text(80),
  role: z.enum(roles),
  /** First password, handed over in person; it must be changed at the first sign-in. */
  firstPassword: newPassword,
  facilityIds: z.array(id).max(100),
});
export const changePersonSchema = z.discriminatedUnion("act", [
  z.strictObject({ act: z.literal("disable"), reason: text(400) }),
  z.strictObject({ act: z.literal("re-enable"), reason: text(400) }),
  /** Takes effect at once while there is one administrator; from two on it waits for another one's "confirm-role". */
  z.strictObject({ act: z.literal("change-role"), role: z.enum(roles), reason: text(400) }),
  z.strictObject({ act: z.literal("confirm-role"), role: z.enum(roles) }),
  z.strictObject({ act: z.literal("set-password"), firstPassword: newPassword }),
]);

export const createFacilitySchema = z.strictObject({
  code: z
    .string()
    .trim()
    .toUpperCase()
    .regex(/^[A-Z0-9]{2,8}$/, "2 to 8 letters or digits"),
  name: text(80),
  barometricPressurePa: z.number().min(50000).max(110000),
  policy: limitPolicySchema,
});
export const changeMembersSchema = z.strictObject({ act: z.enum(["add", "remove"]), personId: id });
export const createSectionSchema = z.strictObject({
  facilityId: id,
  tag: text(20),
  name: text(80),
  description: z.string().trim().max(600),
});

export const createScreeningSchema = z.strictObject({ sectionId: id, title: text(120) });
export const saveDraftSchema = z.strictObject({ baseVersion: z.int().min(1), document: draftDocumentSchema });
export const computeSchema = z.strictObject({ draftVersion: z.int().min(1) });

export const openCeremonySchema = z.strictObject({
  act: z.enum(["sign", "countersign", "return", "withdraw"]),
  rev: z.int().min(1),
});
const signature = {
  rev: z.int().min(1),
  nonce: z.string().min(16).max(80),
  idempotencyKey,
  shownSha256: sha256,
  password,
} as const;
/** `acknowledged`: the ids of every caution that stands with the record, ticked one by one. */
export const signSchema = z.strictObject({ ...signature, acknowledged: z.array(z.string().max(12)).max(40) });
export const countersignSchema = z.strictObject({
  ...signature,
  acknowledged: z.array(z.string().max(12)).max(40),
  conditions: z.array(text(600)).max(20),
});
export const remarkSchema = z.strictObject({ line: z.string().max(12), text: text(1200) });
export const returnSchema = z.strictObject({
  ...signature,
  remarks: z.array(remarkSchema).min(1, "a return needs at least one remark").max(40),
});
export const withdrawSchema = z.strictObject({ ...signature, reason: text(1200) });
export const newRevisionSchema = z.strictObject({ fromRev: z.int().min(1), reason: text(600) });

export const screeningFilterSchema = z.strictObject({
  sectionId: id.optional(),
  facilityId: id.optional(),
  state: z.enum(revisionStates).optional(),
  /** Looked for in the record's number, its title and the section's tag and name. */
  text: z.string().trim().max(80).optional(),
  before: z.coerce.number().int().min(1).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});

export const revisionQuerySchema = z.strictObject({ rev: z.coerce.number().int().min(1).optional() });

export const verificationRangeSchema = z.strictObject({
  from: z.coerce.number().int().min(1).default(1),
  limit: z.coerce.number().int().min(1).max(500).default(500),
});

export const logFilterSchema = z.strictObject({
  record: z.string().trim().max(20).optional(),
  badge: z.string().trim().max(12).optional(),
  kind: z.string().max(40).optional(),
  from: z.iso.date().optional(),
  to: z.iso.date().optional(),
  before: z.coerce.number().int().min(1).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});

export type SignIn = z.infer<typeof signInSchema>;
export type InvitePerson = z.infer<typeof invitePersonSchema>;
export type ChangePerson = z.infer<typeof changePersonSchema>;
export type CreateFacility = z.infer<typeof createFacilitySchema>;
export type CreateSection = z.infer<typeof createSectionSchema>;
export type CreateScreening = z.infer<typeof createScreeningSchema>;
export type SaveDraft = z.infer<typeof saveDraftSchema>;
export type OpenCeremony = z.infer<typeof openCeremonySchema>;
export type Sign = z.infer<typeof signSchema>;
export type Countersign = z.infer<typeof countersignSchema>;
export type Return = z.infer<typeof returnSchema>;
export type Withdraw = z.infer<typeof withdrawSchema>;
export type Remark = z.infer<typeof remarkSchema>;
export type NewRevision = z.infer<typeof newRevisionSchema>;
export type ChangePassword = z.infer<typeof changePasswordSchema>;
export type Preferences = z.infer<typeof preferencesSchema>;
export type ChangeMembers = z.infer<typeof changeMembersSchema>;
export type ScreeningFilter = z.infer<typeof screeningFilterSchema>;
export type LogFilter = z.infer<typeof logFilterSchema>;
