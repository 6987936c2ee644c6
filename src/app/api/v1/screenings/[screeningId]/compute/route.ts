import { computeSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { prepareScreening } from "@/server/screenings/prepare";

export const POST = defineRoute({
  act: "draft.compute",
  body: computeSchema,
  work: (viewer, { body, params }) => prepareScreening(viewer, params.screeningId ?? "", body),
});
