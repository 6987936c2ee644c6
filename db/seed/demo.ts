/**
 * Loads the demo: an invented facility, four people, five sections, three screenings. Everything goes through the same writes as a user's
 * own acts, by people who sign in with their passwords, so the log of a fresh installation verifies from its first entry.
 */
import { eq } from "drizzle-orm";
import { facility } from "@db/schema/app/facility";
import { person } from "@db/schema/ledger/person";
import { defaultPolicy } from "@/contracts/policy";
import type { DraftDocument } from "@/contracts/draft";
import { signOut, signIn } from "@/server/session/write";
import { systemViewer, type Viewer } from "@/server/auth/viewer";
import { readDatabase } from "@/server/database";
import { demoFacilityCode, demoPeople } from "@/server/demo/people";
import { changeMembers, createFacility } from "@/server/facilities/write";
import { enrolPerson } from "@/server/people/write";
import { openSigningPage } from "@/server/screenings/ceremony";
import { createScreening } from "@/server/screenings/create";
import { saveDraft } from "@/server/screenings/draft";
import { listScreenings } from "@/server/screenings/list";
import { prepareScreening } from "@/server/screenings/prepare";
import { getScreening } from "@/server/screenings/read";
import { countersignScreening, signScreening } from "@/server/screenings/sign";
import { listSections } from "@/server/sections/read";
import { createSection } from "@/server/sections/write";
import { methaneExportLoop } from "./methane-export-loop";
import { nitrogenBottleBank } from "./nitrogen-bottle-bank";
import { demoSections } from "./sections";
import { singleBottle } from "./single-bottle";

const browser = { userAgent: "demo loader", network: null };
type Until = "computed" | "signed" | "countersigned";

const demoScreenings: readonly { tag: string; make: () => DraftDocument; until: Until }[] = [
  { tag: "IS-08", make: methaneExportLoop, until: "countersigned" },
  { tag: "IS-52", make: singleBottle, until: "signed" },
  { tag: "IS-52", make: nitrogenBottleBank, until: "computed" },
];

/**
 * Safe to run again: what is there stays, what an interrupted run left out is added. Does nothing to a database that holds people of its
 * own.
 *
 * Returns  false when the database belongs to somebody else
 */
export async function loadDemo(): Promise<boolean> {
  const people = await readDatabase().select({ badge: person.badge }).from(person);
  const known = new Set(people.map(({ badge }) => badge));
  const first = demoPeople.find(({ role }) => role === "administrator");
  if (!first) throw new Error("the demo has no administrator");
  if (known.size > 0 && !known.has(first.badge)) return false;
  if (await isComplete(known)) return true;

  if (!known.has(first.badge)) await enrolPerson(systemViewer("seed"), enrolment(first), { mustChange: false });
  await as(first.badge, async (administrator) => {
    for (const one of demoPeople) {
      if (!known.has(one.badge) && one !== first) await enrolPerson(administrator, enrolment(one), { mustChange: false });
    }
    await loadFacility(administrator);
  });
  await as("E-114", loadSections);
  for (const one of demoScreenings) await loadScreening(one);
  return true;
}

const enrolment = ({ password, ...rest }: (typeof demoPeople)[number]) => ({ ...rest, firstPassword: password });

/** Runs `work` as a demo person who signs in for it. */
async function as<T>(badge: string, work: (viewer: Viewer) => Promise<T>): Promise<T> {
  const { viewer } = await signIn({ badge, password: passwordOf(badge) }, browser);
  try {
    return await work(viewer);
  } finally {
    await signOut(viewer);
  }
}

const passwordOf = (badge: string): string => demoPeople.find((one) => one.badge === badge)?.password ?? "";

const findFacility = async () => (await readDatabase().select().from(facility).where(eq(facility.code, demoFacilityCode)))[0];

async function loadFacility(administrator: Viewer): Promise<void> {
  const made =
    (await findFacility()) ??
    (await createFacility(
      administrator,
      { code: demoFacilityCode, name: "Varn Reach", barometricPressurePa: 101325, policy: defaultPolicy },
      { demo: true },
    ));
  const { getFacility } = await import("@/server/facilities/read");
  const members = new Set((await getFacility(administrator, made.id))?.members.map(({ badge }) => badge));
  const people = await readDatabase().select().from(person);
  for (const { id, badge, role } of people) {
    if ((role === "engineer" || role === "approver") && !members.has(badge)) {
      await changeMembers(administrator, made.id, { act: "add", personId: id });
    }
  }
}

async function loadSections(engineer: Viewer): Promise<void> {
  const place = await findFacility();
  if (!place) throw new Error("the demo facility is missing");
  const present = new Set((await listSections(engineer)).map(({ tag }) => tag));
  for (const one of demoSections) if (!present.has(one.tag)) await createSection(engineer, { ...one, facilityId: place.id });
}

/** Takes one screening as far as it should be, from wherever an earlier run left it. */
async function loadScreening({ tag, make, until }: (typeof demoScreenings)[number]): Promise<void> {
  const document = make();
  const title = document.lines["1.10"]?.typed ?? "";
  const id = await as("E-114", async (engineer) => {
    const section = (await listSections(engineer)).find((one) => one.tag === tag);
    if (!section) throw new Error(`the demo section ${tag} is missing`);
    const present = (await listScreenings(engineer, { sectionId: section.id, limit: 200 })).rows.find(
      (row) => row.title === title,
    );
    const screeningId = present?.id ?? (await createScreening(engineer, { sectionId: section.id, title })).id;
    let view = await getScreening(engineer, screeningId);
    if (view?.state === "draft" && view.draft) {
      const { version } =
        view.draft.version === 1 ? await saveDraft(engineer, screeningId, { baseVersion: 1, document }) : view.draft;
      await prepareScreening(engineer, screeningId, { draftVersion: version });
      view = await getScreening(engineer, screeningId);
    }
    if (view?.state === "computed" && until !== "computed") await sign(engineer, screeningId);
    return screeningId;
  });
  if (until !== "countersigned") return;
  await as("A-027", async (approver) => {
    if ((await getScreening(approver, id))?.state === "signed") await countersign(approver, id);
  });
}

async function sign(engineer: Viewer, screeningId: string): Promise<void> {
  const page = await openSigningPage(engineer, screeningId, { act: "sign", rev: 1 });
  await signScreening(engineer, screeningId, { ...page, ...(await acknowledgement(engineer, screeningId)) });
}

async function countersign(approver: Viewer, screeningId: string): Promise<void> {
  const page = await openSigningPage(approver, screeningId, { act: "countersign", rev: 1 });
  const conditions = ["Demo: repeat when the orifice or the settle-out pressure changes."];
  await countersignScreening(approver, screeningId, { ...page, ...(await acknowledgement(approver, screeningId)), conditions });
}

async function acknowledgement(viewer: Viewer, screeningId: string) {
  const cautions = (await getScreening(viewer, screeningId))?.prepared?.content.cautions ?? [];
  return { rev: 1, password: passwordOf(viewer.badge), acknowledged: cautions.map(({ id }) => id) };
}

/** Whether an earlier run came to its end, told without signing in: its last act was to compute the last screening. */
async function isComplete(known: ReadonlySet<string>): Promise<boolean> {
  if (!demoPeople.every(({ badge }) => known.has(badge))) return false;
  const { isDemoLoaded } = await import("@/server/demo/loaded");
  return isDemoLoaded(demoScreenings.map(({ make }) => make().lines["1.10"]?.typed ?? ""));
}
