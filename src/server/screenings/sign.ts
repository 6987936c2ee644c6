import "server-only";
import type { Countersign, Return, Sign, Withdraw } from "@/contracts/requests";
import type { ReceiptView } from "@/contracts/views";
import type { CeremonyAct } from "@db/schema/app/ceremony";
import type { Viewer } from "@/server/auth/viewer";
import { databases } from "@/server/database";
import type { Receipt } from "@/server/ledger/call";
import type { SigningRequest } from "@/server/ledger/statement";
import { countersignRevision, returnRevision, signRevision, withdrawRevision } from "@/server/ledger/write";
import { reading } from "@/server/reading";
import { Refusal } from "@/server/refusal";
import { authoriseSigning, methodWords, proveOnPage } from "./ceremony";
import { storedRecord } from "./content";
import { parseLineKey } from "@/contracts/lines/registry";
import { requireMatter } from "./matter";
import { blockersOf } from "./blockers";

type Common = { rev: number; nonce: string; idempotencyKey: string; shownSha256: string; password: string };

/** Signs what was shown: every caution ticked, every value with a source, the password again. */
export async function signScreening(viewer: Viewer, screeningId: string, request: Sign): Promise<ReceiptView> {
  return act(viewer, screeningId, "sign", request, async (common) => {
    await refuseBlockers(viewer, request.shownSha256);
    return signRevision(databases(), { ...common, acknowledged: request.acknowledged });
  });
}

/** Countersigns a signed revision, with conditions or without. Never by anybody who had a hand in it. */
export async function countersignScreening(viewer: Viewer, screeningId: string, request: Countersign): Promise<ReceiptView> {
  return act(viewer, screeningId, "countersign", request, (common) =>
    countersignRevision(databases(), { ...common, acknowledged: request.acknowledged, conditions: request.conditions }),
  );
}

/** Gives a signed revision back with remarks, each tied to a line. */
export async function returnScreening(viewer: Viewer, screeningId: string, request: Return): Promise<ReceiptView> {
  const wrong = request.remarks.flatMap(({ line }, at) =>
    parseLineKey(line)
      ? []
      : [{ path: `remarks[${at}].line`, message: `There is no line ${line}. Cite a line such as 4.03 or A5.02.` }],
  );
  if (wrong.length > 0) throw new Refusal("invalid-request", { problems: wrong });
  return act(viewer, screeningId, "return", request, (common) =>
    returnRevision(databases(), { ...common, remarks: request.remarks }),
  );
}

/** Takes a revision back: its author while nobody has decided, an approver once it is countersigned. */
export async function withdrawScreening(viewer: Viewer, screeningId: string, request: Withdraw): Promise<ReceiptView> {
  return act(viewer, screeningId, "withdraw", request, (common) =>
    withdrawRevision(databases(), { ...common, reason: request.reason }),
  );
}

/**
 * What all four share: who may, the password on the open page, then the record. The same request sent again gets the first receipt: the
 * record itself answers a key it knows, before it looks at the state of anything.
 */
async function act(
  viewer: Viewer,
  screeningId: string,
  name: CeremonyAct,
  { rev, nonce, idempotencyKey, shownSha256, password }: Common,
  file: (common: SigningRequest) => Promise<Receipt>,
): Promise<ReceiptView> {
  const found = await reading(viewer, (transaction) => requireMatter(transaction, screeningId));
  authoriseSigning(viewer, found, name, rev);
  await proveOnPage(viewer, { nonce, idempotencyKey, password });
  const factor = methodWords();
  const receipt = await file({ personId: viewer.id, screeningId, rev, nonce, idempotencyKey, shownSha256, factor });
  return { seq: receipt.seq, at: receipt.at, hash: receipt.leaf, contentSha256: shownSha256 };
}

async function refuseBlockers(viewer: Viewer, contentSha256: string): Promise<void> {
  const record = await reading(viewer, (transaction) => storedRecord(transaction, contentSha256)).catch(() => {
    throw new Refusal("content-changed");
  });
  const problems = blockersOf(record);
  if (problems.length > 0) {
    throw new Refusal("invalid-request", {
      detail: "These values have no source. Say where each comes from, then compute again.",
      problems,
    });
  }
}
