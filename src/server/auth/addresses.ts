import "server-only";
import type { Act, OpenAct } from "./matrix";

type Method = "GET" | "POST" | "PUT" | "DELETE";

/**
 * Every address of the API with the acts behind it. A route file that is not listed, or asks for another act than it says here, fails a
 * test; so does a line here without a file.
 */
export const apiAddresses: Record<string, Partial<Record<Method, readonly (Act | OpenAct)[]>>> = {
  "/api/v1/health": { GET: ["health.read"] },
  "/api/v1/session": { GET: ["session.read"], POST: ["session.open"], DELETE: ["session.close"] },
  "/api/v1/sessions/[sessionId]": { DELETE: ["account.change"] },
  "/api/v1/password": { POST: ["account.change"] },
  "/api/v1/preferences": { PUT: ["account.change"] },
  "/api/v1/people": { GET: ["person.list"], POST: ["person.enrol"] },
  "/api/v1/people/[personId]": { POST: ["person.change"] },
  "/api/v1/facilities": { GET: ["facility.list"], POST: ["facility.create"] },
  "/api/v1/facilities/[facilityId]": { GET: ["facility.read"] },
  "/api/v1/facilities/[facilityId]/members": { POST: ["member.change"] },
  "/api/v1/sections": { GET: ["section.list"], POST: ["section.create"] },
  "/api/v1/sections/[sectionId]": { GET: ["section.read"] },
  "/api/v1/screenings": { GET: ["screening.list"], POST: ["screening.create"] },
  "/api/v1/screenings/[screeningId]": { GET: ["screening.read"] },
  "/api/v1/screenings/[screeningId]/draft": { GET: ["draft.read"], PUT: ["draft.edit"] },
  "/api/v1/screenings/[screeningId]/compute": { POST: ["draft.compute"] },
  "/api/v1/screenings/[screeningId]/ceremony": {
    POST: [
      "screening.sign",
      "screening.countersign",
      "screening.return",
      "screening.withdraw-signed",
      "screening.withdraw-countersigned",
    ],
  },
  "/api/v1/screenings/[screeningId]/sign": { POST: ["screening.sign"] },
  "/api/v1/screenings/[screeningId]/countersign": { POST: ["screening.countersign"] },
  "/api/v1/screenings/[screeningId]/return": { POST: ["screening.return"] },
  "/api/v1/screenings/[screeningId]/withdraw": { POST: ["screening.withdraw-signed", "screening.withdraw-countersigned"] },
  "/api/v1/screenings/[screeningId]/revisions": { POST: ["screening.revise"] },
  "/api/v1/calculations": { POST: ["calculation.run"] },
  "/api/v1/log": { GET: ["log.list"] },
  "/api/v1/log/[seq]": { GET: ["log.read"] },
  "/api/v1/log/verification": { GET: ["log.verify"] },
};

/** Every page. `open` pages serve strangers; all others must ask `requireViewer` and pass it to the reads they draw from. */
export const pageAddresses: Record<string, "open" | "signed-in"> = {
  "/": "open",
  "/sign-in": "open",
  "/specimen": "open",
  "/change-password": "signed-in",
  "/desk": "signed-in",
  "/account": "signed-in",
  "/facilities": "signed-in",
  "/facilities/[facilityId]": "signed-in",
  "/sections": "signed-in",
  "/sections/[sectionId]": "signed-in",
  "/screenings": "signed-in",
  "/screenings/new": "signed-in",
  "/screenings/[screeningId]": "signed-in",
  "/screenings/[screeningId]/form/[part]": "signed-in",
  "/screenings/[screeningId]/fluid": "signed-in",
  "/screenings/[screeningId]/compare": "signed-in",
  "/screenings/[screeningId]/window": "signed-in",
  "/screenings/[screeningId]/studies": "signed-in",
  "/screenings/[screeningId]/sign": "signed-in",
  "/screenings/[screeningId]/decide": "signed-in",
  "/change-of-state": "signed-in",
  "/log": "signed-in",
  "/people": "signed-in",
};
