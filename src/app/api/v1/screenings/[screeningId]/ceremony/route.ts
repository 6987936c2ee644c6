import { openCeremonySchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { openSigningPage } from "@/server/screenings/ceremony";

export const POST = defineRoute({
  act: [
    "screening.sign",
    "screening.countersign",
    "screening.return",
    "screening.withdraw-signed",
    "screening.withdraw-countersigned",
  ],
  body: openCeremonySchema,
  work: (viewer, { body, params }) => openSigningPage(viewer, params.screeningId ?? "", body),
});
