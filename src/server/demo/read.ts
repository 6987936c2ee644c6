import "server-only";
import { and, eq, inArray } from "drizzle-orm";
import { facility } from "@db/schema/app/facility";
import { securityEvent } from "@db/schema/app/security-event";
import { person } from "@db/schema/ledger/person";
import type { DemoAccountView } from "@/contracts/views";
import { readDatabase } from "@/server/database";
import { env } from "@/server/env";
import { demoFacilityCode, demoPeople } from "./people";

/**
 * The demo accounts, for the sign-in page. None unless this installation runs the demo and the demo facility is in its database. An account
 * whose password was changed has an empty one here.
 */
export async function listDemoAccounts(): Promise<DemoAccountView[]> {
  if (!env().demo) return [];
  const read = readDatabase();
  const [loaded, people] = await Promise.all([
    read
      .select({ id: facility.id })
      .from(facility)
      .where(and(eq(facility.code, demoFacilityCode), eq(facility.demo, true))),
    read
      .select({ id: person.id, badge: person.badge, printedName: person.printedName, role: person.role, active: person.active })
      .from(person)
      .where(
        inArray(
          person.badge,
          demoPeople.map(({ badge }) => badge),
        ),
      ),
  ]);
  if (loaded.length === 0 || people.length === 0) return [];
  const changed = await read
    .select({ personId: securityEvent.personId, by: securityEvent.details })
    .from(securityEvent)
    .where(
      and(
        inArray(
          securityEvent.personId,
          people.map(({ id }) => id),
        ),
        inArray(securityEvent.kind, ["password-changed", "password-set"]),
      ),
    );
  return demoPeople.flatMap(({ badge, password }) => {
    const found = people.find((one) => one.badge === badge);
    if (!found?.active) return [];
    // One "password-set" is the enrolment itself.
    const sets = changed.filter(({ personId }) => personId === found.id).length;
    return [{ badge, role: found.role, printedName: found.printedName, password: sets > 1 ? "" : password }];
  });
}
