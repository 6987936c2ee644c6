import { returnSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { returnScreening } from "@/server/screenings/sign";

export const POST = defineRoute({
  act: "screening.return",
  body: returnSchema,
  work: (viewer, { body, params }) => returnScreening(viewer, params.screeningId ?? "", body),
});
