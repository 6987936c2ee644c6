import "server-only";
import type { DemoAccountView } from "@/contracts/views";

/**
 * The four people of the demo. Invented, with passwords that are no secret: they are printed by the start command and shown on the sign-in
 * page, both only where the demo is loaded, so that a newcomer can try every role.
 */
export const demoPeople: readonly DemoAccountView[] = [
  { badge: "E-114", role: "engineer", printedName: "Ines Marlow", password: "amber-kettle-on-the-quay" },
  { badge: "A-027", role: "approver", printedName: "Tobias Renk", password: "second-lantern-by-the-door" },
  { badge: "U-009", role: "auditor", printedName: "Hanna Vogt", password: "paper-trail-in-the-attic" },
  { badge: "D-001", role: "administrator", printedName: "Piet Osterman", password: "brass-bell-above-the-gate" },
];

export const demoFacilityCode = "VR";
