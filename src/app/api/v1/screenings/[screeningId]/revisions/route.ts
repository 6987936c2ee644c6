import { newRevisionSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { newRevision } from "@/server/screenings/revise";

export const POST = defineRoute({
  act: "screening.revise",
  body: newRevisionSchema,
  status: 201,
  work: (viewer, { body, params }) => newRevision(viewer, params.screeningId ?? "", body),
});
