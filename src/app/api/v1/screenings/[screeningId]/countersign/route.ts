import { countersignSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { countersignScreening } from "@/server/screenings/sign";

export const POST = defineRoute({
  act: "screening.countersign",
  body: countersignSchema,
  work: (viewer, { body, params }) => countersignScreening(viewer, params.screeningId ?? "", body),
});
