import { revisionQuerySchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { orNotFound } from "@/server/refusal";
import { getScreening } from "@/server/screenings/read";

export const GET = defineRoute({
  act: "screening.read",
  query: revisionQuerySchema,
  work: async (viewer, { params, query }) => orNotFound(await getScreening(viewer, params.screeningId ?? "", query.rev)),
});
