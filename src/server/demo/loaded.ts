import "server-only";
import { and, eq, inArray } from "drizzle-orm";
import { asPerson } from "@db/clients";
import { draft } from "@db/schema/app/draft";
import { facility } from "@db/schema/app/facility";
import { screening } from "@db/schema/app/screening";
import { section } from "@db/schema/app/section";
import { readDatabase } from "@/server/database";
import { demoFacilityCode } from "./people";

/** Whether each of these screenings of the demo facility was computed at least once. For the demo loader. */
export async function isDemoLoaded(titles: readonly string[]): Promise<boolean> {
  const rows = await asPerson(readDatabase(), "system", (transaction) =>
    transaction
      .select({ title: screening.title, prepared: draft.preparedSha256 })
      .from(screening)
      .innerJoin(section, eq(section.id, screening.sectionId))
      .innerJoin(facility, eq(facility.id, section.facilityId))
      .innerJoin(draft, eq(draft.screeningId, screening.id))
      .where(and(eq(facility.code, demoFacilityCode), inArray(screening.title, [...titles]))),
  );
  return titles.every((title) => rows.some((row) => row.title === title && row.prepared !== null));
}
