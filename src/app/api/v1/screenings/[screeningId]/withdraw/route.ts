import { withdrawSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { withdrawScreening } from "@/server/screenings/sign";

export const POST = defineRoute({
  act: ["screening.withdraw-signed", "screening.withdraw-countersigned"],
  body: withdrawSchema,
  work: (viewer, { body, params }) => withdrawScreening(viewer, params.screeningId ?? "", body),
});
